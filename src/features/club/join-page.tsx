import { useQuery } from "@tanstack/react-query";
import { useLocation, useNavigate, useSearchParams } from "react-router-dom";
import { useAccount } from "../../offline/index.ts";
import { Button } from "../../ui/button.tsx";
import { ButtonLink } from "../../ui/button-link.tsx";
import { Notice } from "../../ui/notice.tsx";
import { Page } from "../../ui/page.tsx";
import { membersPath, patterns } from "../../ui/paths.ts";
import { useSubmit } from "../../ui/use-submit.ts";
import { acceptInvitation, readInvitation } from "./club-calls.ts";
import { useAskAnew } from "./use-kept-answer.ts";

/** Where an invitation leads, signed in or not: the token is in its address. */
export default function JoinPage() {
  const token = useSearchParams()[0].get("token") ?? "";
  const account = useAccount();
  const { pathname, search } = useLocation();
  const invitation = useQuery({
    queryKey: ["invitation", token],
    queryFn: () => readInvitation(token),
    networkMode: "always",
    staleTime: Infinity,
  });
  const { data: club, error } = invitation;
  const title = club ? `Join ${club.name}` : "Join a club";
  if (error)
    return (
      <Page title={title} back={{ to: patterns.shed, label: "Shed" }}>
        <Notice tone="error" title={error.message} />
      </Page>
    );
  if (!club) return <main className="flex-1" aria-busy />;
  const back = { from: pathname + search };
  return (
    <Page
      title={title}
      action={
        account ? (
          <Join token={token} name={account.name} state={back} />
        ) : (
          <>
            <ButtonLink look="primary" wide to={patterns.signUp} state={back}>
              I am new here
            </ButtonLink>
            <ButtonLink wide to={patterns.signIn} state={back}>
              Sign in
            </ButtonLink>
          </>
        )
      }
    >
      <p className="text-lg">
        You are invited. {club.name} keeps an eye on its members’ oil pumps with Sumpless, the
        logbook for oil-injected two-strokes.
      </p>
      <ul className="flex list-disc flex-col gap-1 pl-6">
        <li>Joining shows nobody your bikes: you share each of them, or none.</li>
        <li>Organisers and mechanics see your name; never your e-mail address.</li>
        <li>You can leave at any time. What you shared is then shared no more.</li>
      </ul>
    </Page>
  );
}

interface JoinProps {
  token: string;
  name: string;
  /** Where signing in leads back to. */
  state: { from: string };
}

function Join({ token, name, state }: JoinProps) {
  const navigate = useNavigate();
  const askAnew = useAskAnew();
  const { submit, busy, problem } = useSubmit(async () => {
    const club = await acceptInvitation(token);
    await askAnew();
    await navigate(membersPath(club.id), { replace: true });
  });
  return (
    <>
      {problem && (
        <Notice tone="error" title={problem}>
          <ButtonLink to={patterns.signIn} state={state}>
            Sign in
          </ButtonLink>
        </Notice>
      )}
      <Button look="primary" wide disabled={busy} onClick={() => void submit()}>
        Join as {name}
      </Button>
    </>
  );
}
