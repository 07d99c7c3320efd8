/**
 * Every event of the audit log, with the sentence that the admin reads. Rows name people and objects
 * by id; passwords, words, codes, tokens and script text never go in.
 */
export const AUDIT_EVENTS = {
  "signed-in": "Signed in",
  "signed-out": "Signed out",
  "signed-out-everywhere": "Signed out everywhere",
  "sign-in-slowed": "Five wrong sign-ins in a row: further tries have to wait",
  "sign-in-locked": "Too many wrong sign-ins: the account waits for a reset or a day",
  "password-changed": "Changed the password",
  "reset-made": "Made a one-time code for a student",
  "reset-redeemed": "Chose new words with a one-time code",
  "cards-made": "Made new sign-in cards",
  "students-added": "Added students to a class",
  "student-removed": "Took a student out of a class",
  "staff-added": "Added a staff account",
  "staff-disabled": "Disabled a staff account",
  "staff-enabled": "Enabled a staff account",
  "mark-released": "Released a mark",
  "show-forwarded": "Forwarded a show",
  "show-approved": "Approved a show",
  "show-declined": "Sent a show back",
  "lineup-published": "Published the lineup",
  "hash-mismatch": "The server's run of a hand-in differed from the browser's",
  "backup-made": "Made a backup",
  "demo-seeded": "Seeded the demo world",
} as const;

export type AuditEvent = keyof typeof AUDIT_EVENTS;
