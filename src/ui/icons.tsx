import type { ComponentProps } from "react";

/**
 * The few icons of the first load, drawn with one line each on a 24 px field; they stand beside
 * words, or in buttons that carry their own label. Other screens may use lucide-react's.
 */
const icon = (line: string) =>
  function Icon(props: ComponentProps<"svg">) {
    return (
      <svg
        width="24"
        height="24"
        fill="none"
        stroke="currentColor"
        strokeWidth="2"
        strokeLinecap="round"
        strokeLinejoin="round"
        aria-hidden
        {...props}
        viewBox="0 0 24 24"
      >
        <path d={line} />
      </svg>
    );
  };

const CIRCLE = "M12 3a9 9 0 1 1 0 18a9 9 0 1 1 0-18";

export const BackIcon = icon("m15 5-7 7 7 7");
export const OnwardIcon = icon("m9 5 7 7-7 7");
export const DownIcon = icon("m5 9 7 7 7-7");
export const PlusIcon = icon("M12 4v16M4 12h16");
export const MinusIcon = icon("M4 12h16");
export const CloseIcon = icon("m5 5 14 14m0-14L5 19");
export const TickIcon = icon("m4 13 5 5L20 6");
export const PhoneIcon = icon(
  "M8 2.5h8a1.5 1.5 0 0 1 1.5 1.5v16a1.5 1.5 0 0 1-1.5 1.5H8A1.5 1.5 0 0 1 6.5 20V4A1.5 1.5 0 0 1 8 2.5m3 15.5h2",
);
export const InfoIcon = icon(`${CIRCLE}M12 11v5.5m0-9v.1`);
export const CautionIcon = icon("M12 3 2 20.5h20zm0 7v5m0 2.6v.1");
export const ErrorIcon = icon(`${CIRCLE}m-3.5 5.5 7 7m0-7-7 7`);
export const AccountIcon = icon(
  `${CIRCLE}m0 3.5a3.2 3.2 0 1 1 0 6.4a3.2 3.2 0 1 1 0-6.4M6 18.5c2-4.5 10-4.5 12 0`,
);
export const ClubIcon = icon(
  "M9 5a3 3 0 1 1 0 6a3 3 0 1 1 0-6M2.5 19c.5-6.5 12.5-6.5 13 0M16 5.2a3 3 0 0 1 0 5.6m2 2.7c2.2 1 3.3 3 3.5 5.5",
);
export const ExchangeIcon = icon("M4 9.5h15l-4.5-5M20 14.5H5l4.5 5");
