import type { ListedRoute } from "@/lib/http/openapi";
import type { RouteHandler } from "@/lib/http/route";

type Module = Partial<Record<"GET" | "POST" | "PATCH" | "DELETE", RouteHandler>>;

/** Every route of the API by its path. A test compares this list with the route files, so none can be forgotten. */
const MODULES: Record<string, Module> = {};

/** Every route with its handler: what the inventory tests call. */
export const openRoutes = (): (ListedRoute & { handler: RouteHandler })[] =>
  Object.entries(MODULES).flatMap(([path, module]) =>
    (["GET", "POST", "PATCH", "DELETE"] as const).flatMap((verb) => {
      const handler = module[verb];
      return handler ? [{ path, method: verb.toLowerCase() as ListedRoute["method"], definition: handler.definition, handler }] : [];
    }),
  );

/** Every route as the OpenAPI document lists it. */
export const listedRoutes = (): ListedRoute[] => openRoutes();
