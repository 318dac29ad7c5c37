import { Navigate, Route, Routes } from "react-router-dom";
import { membersPath } from "../../ui/paths.ts";
import { LineUpPage } from "./line-up/line-up-page.tsx";
import { MembersPage } from "./members/members-page.tsx";
import { NoClubPage } from "./no-club-page.tsx";
import { TestDayPage } from "./test-day/test-day-page.tsx";
import { WithClub } from "./with-club.tsx";

/** The screens of one club: for those who are not its mechanics, its members. */
export default function ClubRoutes() {
  return (
    <WithClub>
      {(club) => (
        <Routes>
          {club.mechanic ? (
            <>
              <Route index element={<LineUpPage club={club} />} />
              <Route path="test-day" element={<TestDayPage club={club} />} />
            </>
          ) : (
            <Route index element={<Navigate to={membersPath(club.id)} replace />} />
          )}
          <Route path="members" element={<MembersPage club={club} />} />
          <Route path="*" element={<NoClubPage club={club} />} />
        </Routes>
      )}
    </WithClub>
  );
}
