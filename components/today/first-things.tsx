import { Button } from "@/components/ui/button";
import { can, type Permission, type Role } from "@/lib/auth/permissions";

type Thing = { words: string; path: string; permission: Permission };

const HAUL: Thing = { words: "Log haul", path: "/pickups/new", permission: "pickups.make" };
const WEIGH: Thing = { words: "Weigh in", path: "/bins/weigh-in", permission: "weigh-ins.make" };
const TICKET: Thing = { words: "New ticket", path: "/tickets/new", permission: "tickets.draft" };
const COST: Thing = { words: "Add cost", path: "/money/costs/new", permission: "costs.make" };

/** What each role does most, the first of them filled. */
const ORDER: Record<Role, Thing[]> = {
  owner: [HAUL, WEIGH, TICKET],
  bookkeeper: [TICKET, COST],
  collector: [HAUL, WEIGH, COST],
  sorter: [WEIGH, COST],
};

/** The buttons a day starts with, large enough for a glove on the phone. */
export function FirstThings({ slug, role }: { slug: string; role: Role }) {
  return (
    <nav className="first-things" aria-label="Start here">
      {ORDER[role]
        .filter((thing) => can(role, thing.permission))
        .map((thing, index) => (
          <Button key={thing.path} href={`/o/${slug}${thing.path}`} size="lg" variant={index === 0 ? "filled" : "line"}>
            {thing.words}
          </Button>
        ))}
    </nav>
  );
}
