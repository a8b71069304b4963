import type { Metadata } from "next";
import Link from "next/link";
import { PROBLEMS } from "@/api/problem";
import { Breadcrumb } from "../../../_ui/breadcrumb";
import { ScrollFrame } from "../../../_ui/scroll-frame";
import { neighbours } from "../_content/pages";
import { PageLinks } from "../_parts/page-links";

export const metadata: Metadata = { title: "Problems" };

export default function Problems() {
  const entries = Object.entries(PROBLEMS).sort(([, a], [, b]) => a.status - b.status);
  return (
    <>
      <Breadcrumb trail={[{ href: "/docs", label: "Docs" }]} />
      <h1>Problems</h1>
      <p className="mt-2 max-w-prose">
        A call that is refused answers with a problem document (RFC 9457). Its <code>type</code> is the
        address of one of these pages, and for a 422 <code>errors</code> names each field that was wrong.
      </p>
      <ScrollFrame label="All problems" className="mt-3 max-w-prose print:overflow-visible">
        <table className="w-full border-collapse text-table">
          <thead>
            <tr className="border-b border-edge text-start">
              <th scope="col" className="px-1 py-1 text-start font-semibold">
                Status
              </th>
              <th scope="col" className="px-1 py-1 text-start font-semibold">
                Problem
              </th>
            </tr>
          </thead>
          <tbody>
            {entries.map(([code, { status, title }]) => (
              <tr key={code} className="border-b border-rule">
                <td className="px-1 py-1 align-top font-mono">{status}</td>
                <td className="px-1 py-1">
                  <Link href={`/docs/problems/${code}`} className="link">
                    {title}
                  </Link>
                  <br />
                  <code className="text-ink-soft">{code}</code>
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </ScrollFrame>
      <PageLinks {...neighbours("/docs/problems")} />
    </>
  );
}
