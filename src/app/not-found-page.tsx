import { ButtonLink } from "../ui/button-link.tsx";
import { Page } from "../ui/page.tsx";
import { patterns } from "../ui/paths.ts";

export function NotFoundPage() {
  return (
    <Page
      title="There is nothing at this address"
      action={
        <ButtonLink look="primary" wide to={patterns.shed}>
          Go to the Shed
        </ButtonLink>
      }
    >
      <p>The link may be old, or a letter of it lost on the way.</p>
    </Page>
  );
}
