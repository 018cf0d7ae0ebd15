const nothing = new URL("../../node_modules/next/dist/compiled/server-only/empty.js", import.meta.url).href;

/** Next brings the package "server-only" along for its own builds. A command is the server, so it gets the empty half of that package. */
export async function resolve(specifier, context, nextResolve) {
  return specifier === "server-only" ? { url: nothing, shortCircuit: true } : nextResolve(specifier, context);
}
