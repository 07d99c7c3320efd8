import type { SignedInUser } from "../../shared/contracts/auth.ts";
import type { Role } from "../../shared/roles.ts";
import type { BandItem } from "../components/band.tsx";

const ITEMS: Readonly<Record<Role, readonly BandItem[]>> = {
  student: [
    { to: "/home", label: "Home", icon: "home" },
    { to: "/lessons", label: "Lessons", icon: "book" },
    { to: "/shows", label: "My shows", icon: "ribbon" },
    { to: "/words", label: "Words", icon: "letters" },
  ],
  teacher: [
    { to: "/classes", label: "Classes", icon: "people" },
    { to: "/marking", label: "Marking", icon: "pencil" },
    { to: "/lessons", label: "Lessons", icon: "book" },
    { to: "/words", label: "Words", icon: "letters" },
    { to: "/forwarded", label: "Forwarded", icon: "send" },
  ],
  coordinator: [
    { to: "/lineup", label: "Lineup", icon: "calendar" },
    { to: "/event/shows", label: "Shows", icon: "ribbon" },
  ],
  admin: [
    { to: "/admin", label: "Admin", icon: "settings", isExact: true },
    { to: "/admin/audit", label: "Audit log", icon: "history" },
  ],
};

/** What waits behind a link, by its address. */
export type BandCounts = Readonly<Record<string, Pick<BandItem, "count" | "countLabel">>>;

/** The band's links for all roles a person holds, each page once, the public programme last. */
export function bandItems(user: SignedInUser, counts: BandCounts = {}): BandItem[] {
  const items = new Map<string, BandItem>();
  for (const role of user.roles) for (const item of ITEMS[role]) items.set(item.to, { ...item, ...counts[item.to] });
  items.set("/programme", { to: "/programme", label: "On the square", icon: "street" });
  return [...items.values()];
}
