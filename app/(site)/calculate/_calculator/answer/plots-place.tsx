import type { ResistanceResult } from "@/lib/engine/resistance/result-schema";
import { Loading } from "../../../../_ui/states";

type Profile = NonNullable<ResistanceResult["profile"]>;

/** Where the plots along the flow will stand: as many, as tall, so that nothing moves when they come. */
export function PlotsPlace({ profile }: { readonly profile: Profile }) {
  const count = 3 + (varies(profile.conductivity) ? 1 : 0) + (profile.across ? 2 : 0);
  const height = "min-h-[341px] medium:min-h-[325px]";
  return (
    <div className="grid gap-x-4 gap-y-2 medium:grid-cols-2">
      <Loading what="the plots" className={height} />
      {Array.from({ length: count - 1 }, (_, k) => (
        <div key={k} className={`rounded border border-rule ${height}`} />
      ))}
    </div>
  );
}

/** Whether there is anything to plot of a conductivity. */
export function varies(values: readonly number[]): boolean {
  const largest = Math.max(...values);
  return largest - Math.min(...values) > 1e-9 * largest;
}
