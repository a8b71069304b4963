CREATE TABLE `embed_usage` (
	`embed_id` text NOT NULL,
	`day` integer NOT NULL,
	`host` text NOT NULL,
	`requests` integer NOT NULL,
	`computations` integer NOT NULL,
	`refused` integer NOT NULL,
	PRIMARY KEY(`embed_id`, `day`, `host`)
);
--> statement-breakpoint
CREATE TABLE `embed_versions` (
	`embed_id` text NOT NULL,
	`number` integer NOT NULL,
	`definition` text NOT NULL,
	`created_at` integer NOT NULL,
	`created_by` text NOT NULL,
	`saved_at` integer NOT NULL,
	`published_at` integer,
	`published_by` text,
	`restores` integer,
	PRIMARY KEY(`embed_id`, `number`),
	FOREIGN KEY (`embed_id`) REFERENCES `embeds`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `embeds` (
	`id` text PRIMARY KEY NOT NULL,
	`team_id` text NOT NULL,
	`name` text NOT NULL,
	`origins` text NOT NULL,
	`month_quota` integer NOT NULL,
	`published_version` integer,
	`created_at` integer NOT NULL,
	`created_by` text NOT NULL,
	`withdrawn_at` integer,
	FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `embeds_team` ON `embeds` (`team_id`,`created_at`);