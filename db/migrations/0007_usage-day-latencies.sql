CREATE TABLE `usage_day_latencies` (
	`day` integer NOT NULL,
	`team_id` text NOT NULL,
	`bucket` integer NOT NULL,
	`requests` integer NOT NULL,
	PRIMARY KEY(`team_id`, `day`, `bucket`)
);
--> statement-breakpoint
INSERT INTO `usage_day_latencies` (`day`, `team_id`, `bucket`, `requests`)
SELECT hour / 24, team_id, bucket, sum(requests)
FROM `usage_hour_latencies`
GROUP BY team_id, hour / 24, bucket;
