import type { Club } from "../../../shared/schemas/club.ts";

export function roleWords({ organiser, mechanic }: Pick<Club, "organiser" | "mechanic">): string {
  if (organiser && mechanic) return "Organiser and mechanic";
  if (organiser) return "Organiser";
  return mechanic ? "Mechanic" : "Rider";
}
