CREATE TABLE `bike_shares` (
	`bike_id` text NOT NULL,
	`club_id` text NOT NULL,
	`shared_at` text NOT NULL,
	`rank` integer NOT NULL,
	`due_in_hours` real NOT NULL,
	PRIMARY KEY(`bike_id`, `club_id`),
	FOREIGN KEY (`bike_id`) REFERENCES `bikes`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`club_id`) REFERENCES `clubs`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `bike_shares_line_up` ON `bike_shares` (`club_id`,`rank`,`due_in_hours`,`bike_id`);--> statement-breakpoint
CREATE TABLE `club_invites` (
	`id` text PRIMARY KEY NOT NULL,
	`club_id` text NOT NULL,
	`hash` text NOT NULL,
	`email` text,
	`uses_left` integer NOT NULL,
	`created_at` text NOT NULL,
	`expires_at` text NOT NULL,
	FOREIGN KEY (`club_id`) REFERENCES `clubs`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `club_invites_hash_unique` ON `club_invites` (`hash`);--> statement-breakpoint
CREATE INDEX `club_invites_club` ON `club_invites` (`club_id`);--> statement-breakpoint
CREATE TABLE `club_members` (
	`club_id` text NOT NULL,
	`user_id` text NOT NULL,
	`organiser` integer NOT NULL,
	`mechanic` integer NOT NULL,
	`joined_at` text NOT NULL,
	PRIMARY KEY(`club_id`, `user_id`),
	FOREIGN KEY (`club_id`) REFERENCES `clubs`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `club_members_user` ON `club_members` (`user_id`);--> statement-breakpoint
CREATE TABLE `clubs` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`created_at` text NOT NULL,
	`revision` integer DEFAULT 0 NOT NULL
);
--> statement-breakpoint
CREATE TABLE `mails` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`topic` text NOT NULL,
	`user_id` text,
	`bike_id` text,
	`occasion` text,
	`letter` text,
	`queued_at` text NOT NULL,
	`attempts` integer DEFAULT 0 NOT NULL,
	`next_attempt_at` integer,
	`good_until` integer NOT NULL,
	`sent_at` text,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`bike_id`) REFERENCES `bikes`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `mails_occasion` ON `mails` (`user_id`,`topic`,`occasion`);--> statement-breakpoint
CREATE INDEX `mails_bike` ON `mails` (`bike_id`,`topic`,`queued_at`);--> statement-breakpoint
CREATE INDEX `mails_next` ON `mails` (`next_attempt_at`);--> statement-breakpoint
CREATE TABLE `reminders` (
	`user_id` text PRIMARY KEY NOT NULL,
	`due_mails` integer NOT NULL,
	`stop_mails` integer NOT NULL,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
ALTER TABLE `bike_summaries` ADD `due_on` text;--> statement-breakpoint
ALTER TABLE `bike_summaries` ADD `rank` integer DEFAULT 0 NOT NULL;--> statement-breakpoint
ALTER TABLE `bike_summaries` ADD `line_up` text;--> statement-breakpoint
CREATE INDEX `bike_summaries_due_hours` ON `bike_summaries` (`due_in_hours`);--> statement-breakpoint
CREATE INDEX `bike_summaries_due_on` ON `bike_summaries` (`due_on`);