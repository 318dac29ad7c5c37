/**
 * The pages that links in mails and invites lead to, each with `?token=`; those that concern the
 * account itself with `#token=`.
 */
export const mailedPages = {
  verify: "/verify",
  reset: "/reset",
  join: "/join",
  unsubscribe: "/unsubscribe",
} as const;
