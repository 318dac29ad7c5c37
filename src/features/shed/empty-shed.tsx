import { ButtonLink } from "../../ui/button-link.tsx";
import { Column } from "../../ui/column.tsx";
import { usualScale } from "../../ui/column-scale.ts";
import { Page } from "../../ui/page.tsx";
import { patterns } from "../../ui/paths.ts";

const steps = [
  "Add your bike: a name is enough.",
  "Log its engine hours after a ride.",
  "Catch what the oil pump delivers in a syringe. The first check is the baseline; every later one is compared with it.",
];

/** Teaches the first step. */
export default function EmptyShed() {
  return (
    <Page
      title="Your shed is empty"
      action={
        <ButtonLink look="primary" wide to={patterns.newBike}>
          Add a bike
        </ButtonLink>
      }
    >
      <div className="flex items-start gap-6">
        <ol className="flex flex-1 flex-col gap-4">
          {steps.map((step, index) => (
            <li key={step} className="flex gap-3">
              <span aria-hidden className="text-4xl leading-none font-bold text-oil">
                {index + 1}
              </span>
              <span className="text-lg">{step}</span>
            </li>
          ))}
        </ol>
        <div aria-hidden>
          <Column size="small" scale={usualScale(3)} readingMl={3} uMl={0.04} baselineMl={3} />
        </div>
      </div>
    </Page>
  );
}
