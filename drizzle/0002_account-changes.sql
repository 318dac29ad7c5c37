ALTER TABLE `mailed_tokens` ADD `email` text;--> statement-breakpoint
ALTER TABLE `sessions` ADD `signed_in_at` text DEFAULT '' NOT NULL;--> statement-breakpoint
ALTER TABLE `sessions` ADD `seen_at` text DEFAULT '' NOT NULL;--> statement-breakpoint
ALTER TABLE `sessions` ADD `device` text DEFAULT '' NOT NULL;--> statement-breakpoint
-- A session's end is 90 days (7776000 s) after it was last moved: then at the latest it was seen.
UPDATE `sessions` SET
  `signed_in_at` = strftime('%Y-%m-%dT%H:%M:%fZ', `expires_at` - 7776000, 'unixepoch'),
  `seen_at` = strftime('%Y-%m-%dT%H:%M:%fZ', `expires_at` - 7776000, 'unixepoch');
