CREATE TABLE `activity` (
	`seq` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`id` text NOT NULL,
	`at` integer NOT NULL,
	`actor_kind` text NOT NULL,
	`actor_id` text NOT NULL,
	`actor_name` text NOT NULL,
	`team_id` text,
	`action` text NOT NULL,
	`subject_kind` text NOT NULL,
	`subject_id` text NOT NULL,
	`before` text,
	`after` text,
	`address` text,
	`request_id` text
);
--> statement-breakpoint
CREATE INDEX `activity_team` ON `activity` (`team_id`,`seq`);--> statement-breakpoint
CREATE INDEX `activity_subject` ON `activity` (`subject_id`);--> statement-breakpoint
CREATE TABLE `idempotency` (
	`owner` text NOT NULL,
	`key` text NOT NULL,
	`fingerprint` text NOT NULL,
	`status` integer,
	`headers` text,
	`body` text,
	`started_at` integer NOT NULL,
	`expires_at` integer NOT NULL,
	PRIMARY KEY(`owner`, `key`)
);
--> statement-breakpoint
CREATE INDEX `idempotency_expires` ON `idempotency` (`expires_at`);--> statement-breakpoint
CREATE TABLE `rate_limits` (
	`key` text PRIMARY KEY NOT NULL,
	`points` integer DEFAULT 0 NOT NULL,
	`expire` integer
);
--> statement-breakpoint
CREATE TABLE `settings` (
	`name` text PRIMARY KEY NOT NULL,
	`value` text NOT NULL,
	`updated_at` integer NOT NULL
);
--> statement-breakpoint
CREATE TABLE `key_secrets` (
	`id` text PRIMARY KEY NOT NULL,
	`key_id` text NOT NULL,
	`hash` text NOT NULL,
	`created_at` integer NOT NULL,
	`valid_until` integer,
	FOREIGN KEY (`key_id`) REFERENCES `keys`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `key_secrets_key` ON `key_secrets` (`key_id`);--> statement-breakpoint
CREATE TABLE `keys` (
	`id` text PRIMARY KEY NOT NULL,
	`team_id` text NOT NULL,
	`name` text NOT NULL,
	`scopes` text NOT NULL,
	`origins` text NOT NULL,
	`allowed_in_url` integer NOT NULL,
	`minute_quota` integer NOT NULL,
	`month_quota` integer NOT NULL,
	`created_at` integer NOT NULL,
	`created_by` text NOT NULL,
	`expires_at` integer,
	`revoked_at` integer,
	`last_used_at` integer,
	`last_client` text,
	FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `keys_team` ON `keys` (`team_id`,`created_at`);--> statement-breakpoint
CREATE TABLE `material_versions` (
	`material_id` text NOT NULL,
	`version` integer NOT NULL,
	`data` text NOT NULL,
	`created_at` integer NOT NULL,
	`created_by` text NOT NULL,
	PRIMARY KEY(`material_id`, `version`),
	FOREIGN KEY (`material_id`) REFERENCES `materials`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `materials` (
	`id` text PRIMARY KEY NOT NULL,
	`team_id` text NOT NULL,
	`version` integer NOT NULL,
	`created_at` integer NOT NULL,
	`retired_at` integer,
	FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `materials_team` ON `materials` (`team_id`,`created_at`,`id`);--> statement-breakpoint
CREATE TABLE `memberships` (
	`person_id` text NOT NULL,
	`team_id` text NOT NULL,
	`created_at` integer NOT NULL,
	PRIMARY KEY(`person_id`, `team_id`),
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `memberships_team` ON `memberships` (`team_id`);--> statement-breakpoint
CREATE TABLE `people` (
	`id` text PRIMARY KEY NOT NULL,
	`email` text NOT NULL,
	`name` text NOT NULL,
	`role` text NOT NULL,
	`password_hash` text,
	`created_at` integer NOT NULL,
	`removed_at` integer
);
--> statement-breakpoint
CREATE UNIQUE INDEX `people_email` ON `people` (`email`);--> statement-breakpoint
CREATE TABLE `teams` (
	`id` text PRIMARY KEY NOT NULL,
	`slug` text NOT NULL,
	`name` text NOT NULL,
	`created_at` integer NOT NULL
);
--> statement-breakpoint
CREATE UNIQUE INDEX `teams_slug` ON `teams` (`slug`);--> statement-breakpoint
CREATE TABLE `records` (
	`id` text PRIMARY KEY NOT NULL,
	`team_id` text NOT NULL,
	`operation` text NOT NULL,
	`label` text NOT NULL,
	`shape` text,
	`created_at` integer NOT NULL,
	`by_kind` text NOT NULL,
	`by_id` text NOT NULL,
	`by_name` text NOT NULL,
	`request` text NOT NULL,
	`result` text NOT NULL,
	`materials` text NOT NULL,
	`engine` text NOT NULL,
	`catalogue` text NOT NULL,
	FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `records_team` ON `records` (`team_id`,`created_at`,`id`);--> statement-breakpoint
CREATE INDEX `records_shape` ON `records` (`team_id`,`shape`,`created_at`);--> statement-breakpoint
CREATE TABLE `usage_day_details` (
	`day` integer NOT NULL,
	`team_id` text NOT NULL,
	`operation` text NOT NULL,
	`shape` text NOT NULL,
	`status` integer NOT NULL,
	`requests` integer NOT NULL,
	`computations` integer NOT NULL,
	PRIMARY KEY(`team_id`, `day`, `operation`, `shape`, `status`)
);
--> statement-breakpoint
CREATE TABLE `usage_days` (
	`day` integer NOT NULL,
	`key_id` text NOT NULL,
	`team_id` text NOT NULL,
	`requests` integer NOT NULL,
	`computations` integer NOT NULL,
	`refused` integer NOT NULL,
	`failed` integer NOT NULL,
	`latency_us` integer NOT NULL,
	PRIMARY KEY(`key_id`, `day`)
);
--> statement-breakpoint
CREATE INDEX `usage_days_team` ON `usage_days` (`team_id`,`day`);--> statement-breakpoint
CREATE INDEX `usage_days_day` ON `usage_days` (`day`);--> statement-breakpoint
CREATE TABLE `usage_events` (
	`id` integer PRIMARY KEY NOT NULL,
	`at` integer NOT NULL,
	`request_id` text NOT NULL,
	`key_id` text NOT NULL,
	`team_id` text NOT NULL,
	`operation` text NOT NULL,
	`shape` text,
	`status` integer NOT NULL,
	`latency_us` integer NOT NULL,
	`computations` integer NOT NULL,
	`client` text NOT NULL
);
--> statement-breakpoint
CREATE INDEX `usage_events_key` ON `usage_events` (`key_id`,`at`);--> statement-breakpoint
CREATE INDEX `usage_events_team` ON `usage_events` (`team_id`,`at`);--> statement-breakpoint
CREATE TABLE `usage_hour_latencies` (
	`hour` integer NOT NULL,
	`team_id` text NOT NULL,
	`bucket` integer NOT NULL,
	`requests` integer NOT NULL,
	PRIMARY KEY(`team_id`, `hour`, `bucket`)
);
--> statement-breakpoint
CREATE TABLE `usage_hours` (
	`hour` integer NOT NULL,
	`key_id` text NOT NULL,
	`team_id` text NOT NULL,
	`requests` integer NOT NULL,
	`computations` integer NOT NULL,
	`refused` integer NOT NULL,
	`failed` integer NOT NULL,
	`latency_us` integer NOT NULL,
	PRIMARY KEY(`key_id`, `hour`)
);
--> statement-breakpoint
CREATE INDEX `usage_hours_team` ON `usage_hours` (`team_id`,`hour`);--> statement-breakpoint
CREATE INDEX `usage_hours_hour` ON `usage_hours` (`hour`);