import { Notice } from "../../ui/notice.tsx";

/** A browser that gives no storage cannot carry a check over a reload. */
export function UnkeptNotice({ unkept }: { unkept: boolean }) {
  if (!unkept) return null;
  return (
    <Notice tone="caution" title="This phone does not keep the check while you do it">
      <p>Stay on this page until it is saved. A private window may be why.</p>
    </Notice>
  );
}
