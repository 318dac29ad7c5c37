import type { Club } from "../../../shared/schemas/club.ts";
import { Page } from "../../ui/page.tsx";
import { clubPath } from "../../ui/paths.ts";

export function NoClubPage({ club }: { club: Club }) {
  return (
    <Page
      title="There is nothing at this address"
      back={{ to: clubPath(club.id), label: club.name }}
    >
      <p>The link may be old, or meant for a mechanic of the club.</p>
    </Page>
  );
}
