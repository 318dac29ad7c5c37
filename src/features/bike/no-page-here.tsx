import type { BikeRecord } from "../../offline/index.ts";
import { Page } from "../../ui/page.tsx";
import { bikePath } from "../../ui/paths.ts";

export function NoPageHere({ record }: { record: BikeRecord }) {
  return (
    <Page
      title="There is nothing at this address"
      back={{ to: bikePath(record.bikeId), label: record.details.name }}
    >
      <p>The link may be old, or a letter of it lost on the way.</p>
    </Page>
  );
}
