CREATE TABLE `fields` (
	`id` text PRIMARY KEY NOT NULL,
	`owner` text NOT NULL,
	`status` text NOT NULL,
	`created_at` integer NOT NULL,
	`finished_at` integer,
	`request` text NOT NULL,
	`materials` text NOT NULL,
	`size` integer NOT NULL,
	`progress` text,
	`result` text,
	`failure` text,
	`charge` text NOT NULL,
	`record` text,
	`record_id` text,
	`claimed_by` text,
	`claimed_until` integer NOT NULL
);
--> statement-breakpoint
CREATE INDEX `fields_owner` ON `fields` (`owner`,`created_at`);--> statement-breakpoint
CREATE INDEX `fields_status` ON `fields` (`status`,`claimed_until`);--> statement-breakpoint
CREATE TABLE `outlines` (
	`id` text PRIMARY KEY NOT NULL,
	`owner` text NOT NULL,
	`created_at` integer NOT NULL,
	`content` text NOT NULL
);
--> statement-breakpoint
CREATE INDEX `outlines_owner` ON `outlines` (`owner`,`created_at`);