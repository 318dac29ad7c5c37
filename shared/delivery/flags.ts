/**
 * What the product has to say beside a number. A flag travels as its code; the sentence a rider
 * reads stands here, once.
 */
export const flagSentences = {
  "syringe-unknown": "The syringe is not known: marks of 0.2 mL are assumed.",
  "above-capacity": "A level lies above the last mark of the barrel: it is an estimate.",
  "void-runs": "Void runs are kept, and not counted.",
  "other-sequence": "A run of another length or rhythm than the bike's sequence is not counted.",
  "runs-scatter": "The runs scatter more than the marks explain: is there air in the line?",
  "nothing-to-count": "No run of this check can be counted.",
  spoiled: "Something that spoils a reading was noted.",
  "estimated-hours": "The engine hours of this check are an estimate.",
  "below-usual":
    "This first check is over 15 % under what the sequence usually delivers: the baseline may already be low.",
  "no-delivery": "Nothing was delivered.",
  "temperature-differs":
    "The oil was over 10 °C warmer or colder than at the baseline: cold oil is pumped differently.",
  "syringe-differs":
    "Another syringe than the baseline's: what the two scales may differ by is counted in.",
  "session-disagrees": "Checks made together disagree by more than their uncertainty explains.",
  "reads-high":
    "Far above the baseline: a doubled run, another sequence, or a baseline that was low.",
  "against-previous-baseline":
    "Judged against the baseline before this one too: a new baseline cannot hide a fault.",
  "judged-with-earlier":
    "The hours do not show over an hour of riding since the check before: judged with it too, the worse stands.",
  "baseline-cannot-settle": "This baseline cannot settle it; treat the delivery as low.",
  "check-not-counted": "The last check could not be counted.",
  "hours-doubtful":
    "A reading of the hour meter does not fit the others and waits to be confirmed.",
  "hours-below-session":
    "The meter shows less than at the last check: write down the meter change, or check again.",
  "not-closed-out": "Hose may be off: do not start.",
  "trend-scatter": "The checks scatter more about the trend than their uncertainty explains.",
} as const;

export type FlagCode = keyof typeof flagSentences;
