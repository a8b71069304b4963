import { Notice } from "../../_ui/notice";
import type { ConsoleProblem } from "../../console/_shell/call-console";

/** What a form was refused for, where no field of it is to blame; read out as it comes. */
export function FormProblem({ problem }: { readonly problem: ConsoleProblem | null }) {
  return (
    <div role="alert" className="mb-1.5">
      {problem ? (
        <Notice tone="problem" title={problem.problem.title}>
          {problem.problem.detail}
        </Notice>
      ) : null}
    </div>
  );
}
