import * as invitationsTokenAccept from "@/app/api/invitations/[token]/accept/route";
import * as me from "@/app/api/me/route";
import * as mePassword from "@/app/api/me/password/route";
import * as meSignOutEverywhere from "@/app/api/me/sign-out-everywhere/route";
import * as outfitApiKeys from "@/app/api/o/[outfit]/api-keys/route";
import * as outfitApiKeysId from "@/app/api/o/[outfit]/api-keys/[id]/route";
import * as outfitBins from "@/app/api/o/[outfit]/bins/route";
import * as outfitBinsId from "@/app/api/o/[outfit]/bins/[id]/route";
import * as outfitBooksCheck from "@/app/api/o/[outfit]/books/check/route";
import * as outfitCosts from "@/app/api/o/[outfit]/costs/route";
import * as outfitCostsIdVoid from "@/app/api/o/[outfit]/costs/[id]/void/route";
import * as outfitCounts from "@/app/api/o/[outfit]/counts/route";
import * as outfitCountsId from "@/app/api/o/[outfit]/counts/[id]/route";
import * as outfitCountsIdVoid from "@/app/api/o/[outfit]/counts/[id]/void/route";
import * as outfitEarnings from "@/app/api/o/[outfit]/earnings/route";
import * as outfitEntries from "@/app/api/o/[outfit]/entries/route";
import * as outfitGrades from "@/app/api/o/[outfit]/grades/route";
import * as outfitGradesId from "@/app/api/o/[outfit]/grades/[id]/route";
import * as outfitInvitations from "@/app/api/o/[outfit]/invitations/route";
import * as outfitInvitationsId from "@/app/api/o/[outfit]/invitations/[id]/route";
import * as outfitItemKinds from "@/app/api/o/[outfit]/item-kinds/route";
import * as outfitItemKindsId from "@/app/api/o/[outfit]/item-kinds/[id]/route";
import * as outfitMembers from "@/app/api/o/[outfit]/members/route";
import * as outfitMembersId from "@/app/api/o/[outfit]/members/[id]/route";
import * as outfitMonthsMonthClose from "@/app/api/o/[outfit]/months/[month]/close/route";
import * as outfitMonthsMonthReopen from "@/app/api/o/[outfit]/months/[month]/reopen/route";
import * as outfitMovements from "@/app/api/o/[outfit]/movements/route";
import * as outfitPickups from "@/app/api/o/[outfit]/pickups/route";
import * as outfitPickupsId from "@/app/api/o/[outfit]/pickups/[id]/route";
import * as outfitPickupsIdVoid from "@/app/api/o/[outfit]/pickups/[id]/void/route";
import * as outfitPickupsIdWorkOut from "@/app/api/o/[outfit]/pickups/[id]/work-out/route";
import * as outfitPriceSheets from "@/app/api/o/[outfit]/price-sheets/route";
import * as outfitPriceSheetsId from "@/app/api/o/[outfit]/price-sheets/[id]/route";
import * as outfitPrices from "@/app/api/o/[outfit]/prices/route";
import * as outfitSettings from "@/app/api/o/[outfit]/settings/route";
import * as outfitTickets from "@/app/api/o/[outfit]/tickets/route";
import * as outfitTicketsId from "@/app/api/o/[outfit]/tickets/[id]/route";
import * as outfitTicketsIdCheck from "@/app/api/o/[outfit]/tickets/[id]/check/route";
import * as outfitTicketsIdPayments from "@/app/api/o/[outfit]/tickets/[id]/payments/route";
import * as outfitTicketsIdPost from "@/app/api/o/[outfit]/tickets/[id]/post/route";
import * as outfitTicketsIdVoid from "@/app/api/o/[outfit]/tickets/[id]/void/route";
import * as outfitWeighIns from "@/app/api/o/[outfit]/weigh-ins/route";
import * as outfitWeighInsId from "@/app/api/o/[outfit]/weigh-ins/[id]/route";
import * as outfitWeighInsIdVoid from "@/app/api/o/[outfit]/weigh-ins/[id]/void/route";
import * as outfitYards from "@/app/api/o/[outfit]/yards/route";
import * as outfitYardsId from "@/app/api/o/[outfit]/yards/[id]/route";
import * as signUp from "@/app/api/sign-up/route";
import type { ListedRoute } from "@/lib/http/openapi";
import type { RouteHandler } from "@/lib/http/route";

type Module = Partial<Record<"GET" | "POST" | "PATCH" | "DELETE", RouteHandler>>;

/** Every route of the API by its path. A test compares this list with the route files, so none can be forgotten. */
const MODULES: Record<string, Module> = {
  "/api/invitations/{token}/accept": invitationsTokenAccept,
  "/api/me": me,
  "/api/me/password": mePassword,
  "/api/me/sign-out-everywhere": meSignOutEverywhere,
  "/api/o/{outfit}/api-keys": outfitApiKeys,
  "/api/o/{outfit}/api-keys/{id}": outfitApiKeysId,
  "/api/o/{outfit}/bins": outfitBins,
  "/api/o/{outfit}/bins/{id}": outfitBinsId,
  "/api/o/{outfit}/books/check": outfitBooksCheck,
  "/api/o/{outfit}/costs": outfitCosts,
  "/api/o/{outfit}/costs/{id}/void": outfitCostsIdVoid,
  "/api/o/{outfit}/counts": outfitCounts,
  "/api/o/{outfit}/counts/{id}": outfitCountsId,
  "/api/o/{outfit}/counts/{id}/void": outfitCountsIdVoid,
  "/api/o/{outfit}/earnings": outfitEarnings,
  "/api/o/{outfit}/entries": outfitEntries,
  "/api/o/{outfit}/grades": outfitGrades,
  "/api/o/{outfit}/grades/{id}": outfitGradesId,
  "/api/o/{outfit}/invitations": outfitInvitations,
  "/api/o/{outfit}/invitations/{id}": outfitInvitationsId,
  "/api/o/{outfit}/item-kinds": outfitItemKinds,
  "/api/o/{outfit}/item-kinds/{id}": outfitItemKindsId,
  "/api/o/{outfit}/members": outfitMembers,
  "/api/o/{outfit}/members/{id}": outfitMembersId,
  "/api/o/{outfit}/months/{month}/close": outfitMonthsMonthClose,
  "/api/o/{outfit}/months/{month}/reopen": outfitMonthsMonthReopen,
  "/api/o/{outfit}/movements": outfitMovements,
  "/api/o/{outfit}/pickups": outfitPickups,
  "/api/o/{outfit}/pickups/{id}": outfitPickupsId,
  "/api/o/{outfit}/pickups/{id}/void": outfitPickupsIdVoid,
  "/api/o/{outfit}/pickups/{id}/work-out": outfitPickupsIdWorkOut,
  "/api/o/{outfit}/price-sheets": outfitPriceSheets,
  "/api/o/{outfit}/price-sheets/{id}": outfitPriceSheetsId,
  "/api/o/{outfit}/prices": outfitPrices,
  "/api/o/{outfit}/settings": outfitSettings,
  "/api/o/{outfit}/tickets": outfitTickets,
  "/api/o/{outfit}/tickets/{id}": outfitTicketsId,
  "/api/o/{outfit}/tickets/{id}/check": outfitTicketsIdCheck,
  "/api/o/{outfit}/tickets/{id}/payments": outfitTicketsIdPayments,
  "/api/o/{outfit}/tickets/{id}/post": outfitTicketsIdPost,
  "/api/o/{outfit}/tickets/{id}/void": outfitTicketsIdVoid,
  "/api/o/{outfit}/weigh-ins": outfitWeighIns,
  "/api/o/{outfit}/weigh-ins/{id}": outfitWeighInsId,
  "/api/o/{outfit}/weigh-ins/{id}/void": outfitWeighInsIdVoid,
  "/api/o/{outfit}/yards": outfitYards,
  "/api/o/{outfit}/yards/{id}": outfitYardsId,
  "/api/sign-up": signUp,
};

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
