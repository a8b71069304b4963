import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { PROBLEMS, type ProblemKind } from "@/api/problem";
import { Breadcrumb } from "../../../../_ui/breadcrumb";
import { CodeBlock } from "../../../../_ui/code-block";
import { ProseText } from "../../../../_ui/prose-text";

interface Props {
  readonly params: Promise<{ readonly code: string }>;
}

function find(code: string): ProblemKind | undefined {
  return Object.entries(PROBLEMS).find(([known]) => known === code)?.[1];
}

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const problem = find((await params).code);
  return { title: problem ? `${problem.status} ${problem.title}` : "No such problem" };
}

export default async function Problem({ params }: Props) {
  const { code } = await params;
  const problem = find(code);
  if (!problem) notFound();
  const { status, title, description, remedy } = problem;
  const example = JSON.stringify({ type: `/docs/problems/${code}`, title, status }, null, 2);
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
        <CodeBlock code={example} label="Members of the problem document" />
      </article>
    </>
  );
}
