import type { Metadata } from "next";
import Link from "next/link";
import { listedRoutes } from "@/app/api/openapi.json/routes";
import { openApiDocument } from "@/lib/http/openapi";

export const metadata: Metadata = { title: "The API" };

type Parameter = { name: string; in: string; required: boolean };
type Operation = {
  summary: string;
  description: string;
  parameters: Parameter[];
  requestBody?: { content: Record<string, { schema: unknown }> };
  responses: Record<string, { content?: Record<string, { schema: unknown }> }>;
};

function Shape({ label, schema }: { label: string; schema: unknown }) {
  return (
    <details className="mt-2">
      <summary className="cursor-pointer py-2 font-semibold">{label}</summary>
      {/* The box scrolls sideways, so it can be reached by keyboard. */}
      <pre tabIndex={0} aria-label={label} className="overflow-x-auto border border-hair bg-base p-3 text-[12.5px]">
        {JSON.stringify(schema, null, 2)}
      </pre>
    </details>
  );
}

function OperationPanel({ path, method, operation }: { path: string; method: string; operation: Operation }) {
  const body = operation.requestBody?.content["application/json"]?.schema;
  const [status, good] = Object.entries(operation.responses).find(([code]) => code.startsWith("2")) ?? ["200", {}];
  const answer = good.content?.["application/json"]?.schema;
  return (
    <section className="panel">
      <header className="flex-wrap">
        <h2 className="break-all">
          {method.toUpperCase()} {path}
        </h2>
      </header>
      <div className="in">
        <p>{operation.summary}.</p>
        <p className="mut">{operation.description}</p>
        {operation.parameters.length > 0 && (
          <p className="mt-2">
            Takes: {operation.parameters.map((parameter) => `${parameter.name} (${parameter.in}${parameter.required ? "" : ", optional"})`).join(", ")}
          </p>
        )}
        {body !== undefined && <Shape label={`What ${method.toUpperCase()} ${path} takes`} schema={body} />}
        {answer !== undefined && <Shape label={`What ${method.toUpperCase()} ${path} answers with ${status}`} schema={answer} />}
      </div>
    </section>
  );
}

/** The API as a page: the same document that scripts read at /api/openapi.json. */
export default function ApiPage() {
  const document = openApiDocument(listedRoutes()) as { info: { description: string }; paths: Record<string, Record<string, Operation>> };
  return (
    <main className="mx-auto grid max-w-[1000px] gap-4 p-4">
      <h1>The API</h1>
      <p>{document.info.description}</p>
      <p>
        Sign in, or send <code>Authorization: Bearer</code> with an API key from the settings of your outfit. A request that books something takes an{" "}
        <code>Idempotency-Key</code>: sent twice, it books once. Errors are problem documents that name the field.{" "}
        <Link className="link" href="/api/openapi.json" prefetch={false}>
          Read it as OpenAPI 3.1
        </Link>
      </p>
      {Object.entries(document.paths).flatMap(([path, methods]) =>
        Object.entries(methods).map(([method, operation]) => <OperationPanel key={`${method} ${path}`} path={path} method={method} operation={operation} />),
      )}
    </main>
  );
}
