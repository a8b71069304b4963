CREATE TABLE `record_materials` (
	`material_id` text NOT NULL,
	`record_id` text NOT NULL,
	`version` integer NOT NULL,
	`team_id` text NOT NULL,
	`created_at` integer NOT NULL,
	PRIMARY KEY(`material_id`, `record_id`),
	FOREIGN KEY (`record_id`) REFERENCES `records`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `record_materials_record` ON `record_materials` (`record_id`);--> statement-breakpoint
CREATE INDEX `record_materials_used` ON `record_materials` (`material_id`,`team_id`,`created_at`);--> statement-breakpoint
CREATE TABLE `usage_day_clients` (
	`day` integer NOT NULL,
	`key_id` text NOT NULL,
	`team_id` text NOT NULL,
	`client` text NOT NULL,
	`requests` integer NOT NULL,
	`computations` integer NOT NULL,
	`last_at` integer NOT NULL,
	PRIMARY KEY(`key_id`, `day`, `client`)
);
--> statement-breakpoint
CREATE INDEX `usage_day_clients_day` ON `usage_day_clients` (`day`);--> statement-breakpoint
CREATE INDEX `usage_events_at` ON `usage_events` (`at`);--> statement-breakpoint
CREATE INDEX `usage_events_refused` ON `usage_events` (`at`) WHERE status >= 400;--> statement-breakpoint
INSERT INTO `record_materials` (`material_id`, `record_id`, `version`, `team_id`, `created_at`)
SELECT json_extract(used.value, '$.id'), r.id, max(json_extract(used.value, '$.version')), r.team_id, r.created_at
FROM `records` r, json_each(r.materials) used
GROUP BY json_extract(used.value, '$.id'), r.id;--> statement-breakpoint
INSERT INTO `usage_day_clients` (`day`, `key_id`, `team_id`, `client`, `requests`, `computations`, `last_at`)
SELECT at / 86400000, key_id, team_id, client, count(*), sum(computations), max(at)
FROM `usage_events`
GROUP BY key_id, at / 86400000, client;
