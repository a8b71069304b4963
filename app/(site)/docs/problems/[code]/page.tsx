import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { type ShownRefusal, shownRefusal } from "@/api/examples/refusals";
import { PROBLEMS } from "@/api/problem";
import { registry } from "@/api/registry";
import type { RefusalCode } from "@/lib/service/refusal";
import { sharedService } from "@/lib/service/service";
import { Breadcrumb } from "../../../../_ui/breadcrumb";
import { CodeBlock } from "../../../../_ui/code-block";
import { ProseText } from "../../../../_ui/prose-text";

interface Props {
  readonly params: Promise<{ readonly code: string }>;
}

function known(code: string): code is RefusalCode {
  return Object.keys(PROBLEMS).includes(code);
}

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { code } = await params;
  const problem = known(code) ? PROBLEMS[code] : undefined;
  return { title: problem ? `${problem.status} ${problem.title}` : "No such problem" };
}

export default async function Problem({ params }: Props) {
  const { code } = await params;
  if (!known(code)) notFound();
  const { status, title, description, remedy } = PROBLEMS[code];
  const { origin } = sharedService().config;
  const refusal = await shownRefusal(registry, origin, code);
  return (
    <>
      <Breadcrumb
        trail={[
          { href: "/docs", label: "Docs" },
          { href: "/docs/problems", label: "Problems" },
        ]}
      />
      <article className="prose">
        <h1>{title}</h1>
        <p className="font-mono text-table text-ink-soft">
          {status} · {code}
        </p>
        <p>
          <ProseText text={description} />
        </p>
        <h2>What to do</h2>
        <p>
          <ProseText text={remedy} />
        </p>
        <h2>How to recognise it</h2>
        <p>
          The answer has the status {status}, the media type <code>application/problem+json</code> and these
          members; <code>detail</code> says what was wrong this time, and <code>instance</code> is the id of
          the request.
        </p>
        {refusal ? (
          <Refusal {...refusal} />
        ) : (
          <CodeBlock
            code={JSON.stringify({ type: `${origin}/docs/problems/${code}`, title, status }, null, 2)}
            label="Members of the problem document"
          />
        )}
      </article>
    </>
  );
}

/** A call that was really made and refused, with what comes before it. */
function Refusal({ calls, answer }: ShownRefusal) {
  return (
    <>
      {calls.map((call, index) => (
        <CodeBlock
          key={index}
          code={call}
          label={index === calls.length - 1 ? "A call that is refused" : "A call before it"}
        />
      ))}
      <CodeBlock code={answer} label="Its answer" />
    </>
  );
}
