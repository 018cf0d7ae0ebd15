CREATE TABLE `ended_sessions` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	CONSTRAINT `ended_sessions_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE INDEX `ended_sessions_age` ON `ended_sessions` (`expires_at`);