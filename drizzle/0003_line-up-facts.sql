CREATE TABLE `line_up_facts` (
	`bike_id` text PRIMARY KEY NOT NULL,
	`rank` integer NOT NULL,
	`due_in_hours` real NOT NULL,
	`due_on` text,
	`facts` text NOT NULL,
	FOREIGN KEY (`bike_id`) REFERENCES `bikes`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `line_up_facts_due_hours` ON `line_up_facts` (`due_in_hours`);--> statement-breakpoint
CREATE INDEX `line_up_facts_due_on` ON `line_up_facts` (`due_on`);--> statement-breakpoint
DROP INDEX `bike_summaries_due_hours`;--> statement-breakpoint
DROP INDEX `bike_summaries_due_on`;--> statement-breakpoint
ALTER TABLE `bike_summaries` DROP COLUMN `due_on`;--> statement-breakpoint
ALTER TABLE `bike_summaries` DROP COLUMN `rank`;--> statement-breakpoint
ALTER TABLE `bike_summaries` DROP COLUMN `line_up`;