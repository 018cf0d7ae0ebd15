CREATE TABLE `api_keys` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(120) NOT NULL,
	`role` enum('owner','bookkeeper','collector','sorter') NOT NULL,
	`prefix` varchar(16) character set ascii collate ascii_bin NOT NULL,
	`key_hash` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`created_by` char(36) character set ascii collate ascii_bin NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`last_used_at` datetime(3),
	`revoked_at` datetime(3),
	CONSTRAINT `api_keys_outfit_id_id_pk` PRIMARY KEY(`outfit_id`,`id`),
	CONSTRAINT `api_keys_hash` UNIQUE(`key_hash`)
);
--> statement-breakpoint
CREATE TABLE `audit_log` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`at` datetime(3) NOT NULL,
	`member_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`api_key_id` char(36) character set ascii collate ascii_bin,
	`action` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`subject_type` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`subject_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`request_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`detail` json,
	CONSTRAINT `audit_log_outfit_id_id_pk` PRIMARY KEY(`outfit_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `idempotency_keys` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`key_hash` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`fingerprint` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`answer` text,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `idempotency_keys_outfit_id_key_hash_pk` PRIMARY KEY(`outfit_id`,`key_hash`)
);
--> statement-breakpoint
CREATE TABLE `invitations` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`role` enum('owner','bookkeeper','collector','sorter') NOT NULL,
	`note` varchar(200),
	`token_hash` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`created_by` char(36) character set ascii collate ascii_bin NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`accepted_at` datetime(3),
	`revoked_at` datetime(3),
	CONSTRAINT `invitations_outfit_id_id_pk` PRIMARY KEY(`outfit_id`,`id`),
	CONSTRAINT `invitations_token` UNIQUE(`token_hash`)
);
--> statement-breakpoint
CREATE TABLE `memberships` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`user_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`role` enum('owner','bookkeeper','collector','sorter') NOT NULL,
	`removed_at` datetime(3),
	`version` int NOT NULL DEFAULT 1,
	`joined_at` datetime(3) NOT NULL,
	CONSTRAINT `memberships_outfit_id_id_pk` PRIMARY KEY(`outfit_id`,`id`),
	CONSTRAINT `memberships_user` UNIQUE(`user_id`,`outfit_id`)
);
--> statement-breakpoint
CREATE TABLE `outfits` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`slug` varchar(60) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(120) NOT NULL,
	`place` varchar(120),
	`country` varchar(2) character set ascii collate ascii_bin NOT NULL,
	`currency` varchar(3) character set ascii collate ascii_bin NOT NULL,
	`weight_unit` enum('lb','kg') NOT NULL,
	`time_zone` varchar(64) NOT NULL,
	`stale_after_days` int NOT NULL DEFAULT 7,
	`hides_money` boolean NOT NULL DEFAULT false,
	`version` int NOT NULL DEFAULT 1,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `outfits_id` PRIMARY KEY(`id`),
	CONSTRAINT `outfits_slug` UNIQUE(`slug`)
);
--> statement-breakpoint
CREATE TABLE `rate_limits` (
	`key` varchar(255) NOT NULL,
	`points` int NOT NULL DEFAULT 0,
	`expire` bigint unsigned,
	CONSTRAINT `rate_limits_key` PRIMARY KEY(`key`)
);
--> statement-breakpoint
CREATE TABLE `users` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`email` varchar(254) NOT NULL,
	`name` varchar(120) NOT NULL,
	`password_hash` varchar(255) NOT NULL,
	`session_version` int NOT NULL DEFAULT 1,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `users_id` PRIMARY KEY(`id`),
	CONSTRAINT `users_email` UNIQUE(`email`)
);
--> statement-breakpoint
CREATE TABLE `grades` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`key` varchar(60) character set ascii collate ascii_bin,
	`name` varchar(120) NOT NULL,
	`family` enum('copper','wire','brass','aluminum','steel','stainless','lead-zinc','motors','electronics','precious','other') NOT NULL,
	`trade_code` varchar(40),
	`what` text NOT NULL,
	`not_this` text NOT NULL,
	`typical_recovery` decimal(6,4),
	`regulated` text,
	`position` int NOT NULL,
	`active` boolean NOT NULL DEFAULT true,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `grades_outfit_id_id_pk` PRIMARY KEY(`outfit_id`,`id`),
	CONSTRAINT `grades_key` UNIQUE(`outfit_id`,`key`),
	CONSTRAINT `grades_name` UNIQUE(`outfit_id`,`name`)
);
--> statement-breakpoint
CREATE TABLE `item_kind_parts` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`item_kind_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`position` int NOT NULL,
	`key` varchar(60) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(120) NOT NULL,
	`where_it_sits` text NOT NULL,
	`looks_like` text NOT NULL,
	`test` text,
	`grade` varchar(60) character set ascii collate ascii_bin NOT NULL,
	`alt_grade` varchar(60) character set ascii collate ascii_bin,
	`leave_as` varchar(60) character set ascii collate ascii_bin,
	`per_item` int NOT NULL,
	`typical_weight` decimal(14,4) NOT NULL,
	`weight_mark` varchar(20) character set ascii collate ascii_bin NOT NULL,
	`often_missed` boolean NOT NULL,
	`minutes` decimal(6,1),
	`hazard` varchar(40) character set ascii collate ascii_bin,
	CONSTRAINT `item_kind_parts_outfit_id_item_kind_id_position_pk` PRIMARY KEY(`outfit_id`,`item_kind_id`,`position`)
);
--> statement-breakpoint
CREATE TABLE `item_kinds` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`key` varchar(60) character set ascii collate ascii_bin,
	`name` varchar(120) NOT NULL,
	`plural` varchar(120) NOT NULL,
	`tile_name` varchar(40) NOT NULL,
	`group_name` varchar(60) NOT NULL,
	`typical_weight` decimal(14,4) NOT NULL,
	`weight_mark` varchar(20) character set ascii collate ascii_bin NOT NULL,
	`minutes` decimal(6,1),
	`hazards` json NOT NULL,
	`hold_until` varchar(40) character set ascii collate ascii_bin,
	`sell_whole_grade` varchar(60) character set ascii collate ascii_bin,
	`position` int NOT NULL,
	`active` boolean NOT NULL DEFAULT true,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `item_kinds_outfit_id_id_pk` PRIMARY KEY(`outfit_id`,`id`),
	CONSTRAINT `item_kinds_key` UNIQUE(`outfit_id`,`key`)
);
--> statement-breakpoint
CREATE TABLE `account_balances` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`account` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`balance_minor` bigint NOT NULL,
	CONSTRAINT `account_balances_outfit_id_account_pk` PRIMARY KEY(`outfit_id`,`account`)
);
--> statement-breakpoint
CREATE TABLE `account_months` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`month` varchar(7) character set ascii collate ascii_bin NOT NULL,
	`account` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`amount_minor` bigint NOT NULL,
	CONSTRAINT `account_months_outfit_id_month_account_pk` PRIMARY KEY(`outfit_id`,`month`,`account`)
);
--> statement-breakpoint
CREATE TABLE `accounts` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`code` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(120) NOT NULL,
	`kind` enum('asset','liability','equity','income','expense') NOT NULL,
	`position` int NOT NULL,
	CONSTRAINT `accounts_outfit_id_code_pk` PRIMARY KEY(`outfit_id`,`code`)
);
--> statement-breakpoint
CREATE TABLE `book_state` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`next_pickup_number` int NOT NULL DEFAULT 1,
	`next_sequence` int NOT NULL DEFAULT 1,
	CONSTRAINT `book_state_outfit_id` PRIMARY KEY(`outfit_id`)
);
--> statement-breakpoint
CREATE TABLE `entries` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`sequence` int NOT NULL,
	`occurred_on` date NOT NULL,
	`kind` varchar(20) character set ascii collate ascii_bin NOT NULL,
	`document_type` varchar(20) character set ascii collate ascii_bin NOT NULL,
	`document_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`reverses_id` char(36) character set ascii collate ascii_bin,
	`made_by` char(36) character set ascii collate ascii_bin NOT NULL,
	`made_at` datetime(3) NOT NULL,
	CONSTRAINT `entries_outfit_id_id_pk` PRIMARY KEY(`outfit_id`,`id`),
	CONSTRAINT `entries_reverses` UNIQUE(`outfit_id`,`reverses_id`)
);
--> statement-breakpoint
CREATE TABLE `grade_stock` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`grade_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`quantity` decimal(14,4) NOT NULL,
	`cost_minor` bigint NOT NULL,
	CONSTRAINT `grade_stock_outfit_id_grade_id_pk` PRIMARY KEY(`outfit_id`,`grade_id`),
	CONSTRAINT `grade_stock_not_negative` CHECK(quantity >= 0 and cost_minor >= 0),
	CONSTRAINT `grade_stock_empty_costs_nothing` CHECK(quantity > 0 or cost_minor = 0)
);
--> statement-breakpoint
CREATE TABLE `months` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`month` varchar(7) character set ascii collate ascii_bin NOT NULL,
	`closed_at` datetime(3),
	`closed_by` char(36) character set ascii collate ascii_bin,
	`reopened_at` datetime(3),
	`reopened_by` char(36) character set ascii collate ascii_bin,
	CONSTRAINT `months_outfit_id_month_pk` PRIMARY KEY(`outfit_id`,`month`)
);
--> statement-breakpoint
CREATE TABLE `movement_lines` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`movement_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`line` int NOT NULL,
	`place` enum('outside','pile','bin','load','sold','waste','variance') NOT NULL,
	`bin_id` char(36) character set ascii collate ascii_bin,
	`pickup_id` char(36) character set ascii collate ascii_bin,
	`grade_id` char(36) character set ascii collate ascii_bin,
	`quantity` decimal(14,4) NOT NULL,
	`occurred_on` date NOT NULL,
	CONSTRAINT `movement_lines_outfit_id_movement_id_line_pk` PRIMARY KEY(`outfit_id`,`movement_id`,`line`),
	CONSTRAINT `movement_lines_bin_known` CHECK((place = 'bin') = (bin_id is not null)),
	CONSTRAINT `movement_lines_lot_known` CHECK((place = 'pile') = (pickup_id is not null)),
	CONSTRAINT `movement_lines_graded` CHECK(place not in ('bin', 'load', 'sold') or grade_id is not null)
);
--> statement-breakpoint
CREATE TABLE `movements` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`sequence` int NOT NULL,
	`occurred_on` date NOT NULL,
	`kind` varchar(20) character set ascii collate ascii_bin NOT NULL,
	`document_type` varchar(20) character set ascii collate ascii_bin NOT NULL,
	`document_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`reverses_id` char(36) character set ascii collate ascii_bin,
	`made_by` char(36) character set ascii collate ascii_bin NOT NULL,
	`made_at` datetime(3) NOT NULL,
	CONSTRAINT `movements_outfit_id_id_pk` PRIMARY KEY(`outfit_id`,`id`),
	CONSTRAINT `movements_reverses` UNIQUE(`outfit_id`,`reverses_id`)
);
--> statement-breakpoint
CREATE TABLE `postings` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`entry_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`line` int NOT NULL,
	`account` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`amount_minor` bigint NOT NULL,
	`grade_id` char(36) character set ascii collate ascii_bin,
	`yard_id` char(36) character set ascii collate ascii_bin,
	`pickup_id` char(36) character set ascii collate ascii_bin,
	`ticket_id` char(36) character set ascii collate ascii_bin,
	`member_id` char(36) character set ascii collate ascii_bin,
	`occurred_on` date NOT NULL,
	CONSTRAINT `postings_outfit_id_entry_id_line_pk` PRIMARY KEY(`outfit_id`,`entry_id`,`line`)
);
--> statement-breakpoint
CREATE TABLE `lots` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`pickup_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`remaining_weight` decimal(14,4) NOT NULL,
	`remaining_cost_minor` bigint NOT NULL,
	CONSTRAINT `lots_outfit_id_pickup_id_pk` PRIMARY KEY(`outfit_id`,`pickup_id`),
	CONSTRAINT `lots_not_negative` CHECK(remaining_weight >= 0 and remaining_cost_minor >= 0)
);
--> statement-breakpoint
CREATE TABLE `pickup_items` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`pickup_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`line` int NOT NULL,
	`item_kind_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`count` int NOT NULL,
	`weighed` decimal(14,4),
	`estimated_weight` decimal(14,4) NOT NULL,
	CONSTRAINT `pickup_items_outfit_id_pickup_id_line_pk` PRIMARY KEY(`outfit_id`,`pickup_id`,`line`),
	CONSTRAINT `pickup_items_count` CHECK(count > 0)
);
--> statement-breakpoint
CREATE TABLE `pickups` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`number` int NOT NULL,
	`picked_up_on` date NOT NULL,
	`source` enum('curb','call-out','drop-off','bought') NOT NULL,
	`place` varchar(200),
	`note` varchar(2000),
	`paid_minor` bigint NOT NULL,
	`paid_from` enum('cash','bank','card','own-pocket') NOT NULL,
	`estimated_weight` decimal(14,4) NOT NULL,
	`state` enum('open','worked-out','void') NOT NULL DEFAULT 'open',
	`version` int NOT NULL DEFAULT 1,
	`made_by` char(36) character set ascii collate ascii_bin NOT NULL,
	`made_at` datetime(3) NOT NULL,
	`voided_at` datetime(3),
	CONSTRAINT `pickups_outfit_id_id_pk` PRIMARY KEY(`outfit_id`,`id`),
	CONSTRAINT `pickups_number` UNIQUE(`outfit_id`,`number`),
	CONSTRAINT `pickups_paid` CHECK(paid_minor >= 0)
);
--> statement-breakpoint
CREATE TABLE `bin_balances` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`bin_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`quantity` decimal(14,4) NOT NULL,
	`held_since` date,
	CONSTRAINT `bin_balances_outfit_id_bin_id_pk` PRIMARY KEY(`outfit_id`,`bin_id`),
	CONSTRAINT `bin_balances_not_negative` CHECK(quantity >= 0)
);
--> statement-breakpoint
CREATE TABLE `bins` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`label` varchar(30) NOT NULL,
	`grade_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`tare` decimal(14,4) NOT NULL,
	`place` varchar(120),
	`sell_point` decimal(14,4),
	`put_away_at` datetime(3),
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `bins_outfit_id_id_pk` PRIMARY KEY(`outfit_id`,`id`),
	CONSTRAINT `bins_label` UNIQUE(`outfit_id`,`label`),
	CONSTRAINT `bins_grade` UNIQUE(`outfit_id`,`id`,`grade_id`),
	CONSTRAINT `bins_tare` CHECK(tare >= 0)
);
--> statement-breakpoint
CREATE TABLE `counts` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`bin_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`grade_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`counted_on` date NOT NULL,
	`gross` decimal(14,4) NOT NULL,
	`tare` decimal(14,4) NOT NULL,
	`net` decimal(14,4) NOT NULL,
	`book_quantity` decimal(14,4) NOT NULL,
	`difference` decimal(14,4) NOT NULL,
	`note` varchar(2000),
	`made_by` char(36) character set ascii collate ascii_bin NOT NULL,
	`made_at` datetime(3) NOT NULL,
	`voided_at` datetime(3),
	`voided_by` char(36) character set ascii collate ascii_bin,
	CONSTRAINT `counts_outfit_id_id_pk` PRIMARY KEY(`outfit_id`,`id`),
	CONSTRAINT `counts_net` CHECK(net >= 0 and net - book_quantity = difference)
);
--> statement-breakpoint
CREATE TABLE `weigh_ins` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`bin_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`grade_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`weighed_on` date NOT NULL,
	`pickup_id` char(36) character set ascii collate ascii_bin,
	`from_pile` boolean NOT NULL DEFAULT false,
	`gross` decimal(14,4) NOT NULL,
	`tare` decimal(14,4) NOT NULL,
	`net` decimal(14,4) NOT NULL,
	`draws` json NOT NULL,
	`unit` varchar(12) character set ascii collate ascii_bin NOT NULL,
	`note` varchar(2000),
	`made_by` char(36) character set ascii collate ascii_bin NOT NULL,
	`made_at` datetime(3) NOT NULL,
	`voided_at` datetime(3),
	`voided_by` char(36) character set ascii collate ascii_bin,
	CONSTRAINT `weigh_ins_outfit_id_id_pk` PRIMARY KEY(`outfit_id`,`id`),
	CONSTRAINT `weigh_ins_net` CHECK(net > 0 and gross - tare = net)
);
--> statement-breakpoint
CREATE TABLE `grade_aliases` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`yard_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`wording` varchar(120) NOT NULL,
	`grade_id` char(36) character set ascii collate ascii_bin NOT NULL,
	CONSTRAINT `grade_aliases_outfit_id_yard_id_wording_pk` PRIMARY KEY(`outfit_id`,`yard_id`,`wording`)
);
--> statement-breakpoint
CREATE TABLE `price_sheet_lines` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`sheet_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`line` int NOT NULL,
	`grade_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`price` decimal(14,6) NOT NULL,
	`per` enum('lb','kg','cwt','short-ton','long-ton','tonne','ozt','each') NOT NULL,
	`normalised` decimal(24,12),
	`yard_wording` varchar(120),
	CONSTRAINT `price_sheet_lines_outfit_id_sheet_id_line_pk` PRIMARY KEY(`outfit_id`,`sheet_id`,`line`),
	CONSTRAINT `price_sheet_lines_grade` UNIQUE(`outfit_id`,`sheet_id`,`grade_id`),
	CONSTRAINT `price_sheet_lines_price` CHECK(price >= 0)
);
--> statement-breakpoint
CREATE TABLE `price_sheets` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`yard_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`in_force_from` date NOT NULL,
	`last_day` date,
	`version` int NOT NULL DEFAULT 1,
	`made_by` char(36) character set ascii collate ascii_bin NOT NULL,
	`made_at` datetime(3) NOT NULL,
	CONSTRAINT `price_sheets_outfit_id_id_pk` PRIMARY KEY(`outfit_id`,`id`),
	CONSTRAINT `price_sheets_start` UNIQUE(`outfit_id`,`yard_id`,`in_force_from`),
	CONSTRAINT `price_sheets_days` CHECK(last_day is null or last_day >= in_force_from)
);
--> statement-breakpoint
CREATE TABLE `yards` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(120) NOT NULL,
	`place` varchar(200),
	`phone` varchar(40),
	`hours` varchar(200),
	`note` varchar(2000),
	`active` boolean NOT NULL DEFAULT true,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `yards_outfit_id_id_pk` PRIMARY KEY(`outfit_id`,`id`),
	CONSTRAINT `yards_name` UNIQUE(`outfit_id`,`name`)
);
--> statement-breakpoint
CREATE TABLE `ticket_lines` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`ticket_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`line` int NOT NULL,
	`grade_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`sold_as_grade_id` char(36) character set ascii collate ascii_bin,
	`bin_id` char(36) character set ascii collate ascii_bin,
	`gross` decimal(14,4),
	`tare` decimal(14,4),
	`deduction` decimal(14,4),
	`net` decimal(14,4) NOT NULL,
	`pieces` int,
	`price` decimal(14,6) NOT NULL,
	`per` enum('lb','kg','cwt','short-ton','long-ton','tonne','ozt','each') NOT NULL,
	`amount_minor` bigint NOT NULL,
	`yard_wording` varchar(120),
	CONSTRAINT `ticket_lines_outfit_id_ticket_id_line_pk` PRIMARY KEY(`outfit_id`,`ticket_id`,`line`),
	CONSTRAINT `ticket_lines_net` CHECK(net > 0)
);
--> statement-breakpoint
CREATE TABLE `ticket_payments` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`ticket_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`paid_on` date NOT NULL,
	`amount_minor` bigint NOT NULL,
	`method` enum('cash','check','transfer','card') NOT NULL,
	`made_by` char(36) character set ascii collate ascii_bin NOT NULL,
	`made_at` datetime(3) NOT NULL,
	`voided_at` datetime(3),
	CONSTRAINT `ticket_payments_outfit_id_id_pk` PRIMARY KEY(`outfit_id`,`id`),
	CONSTRAINT `ticket_payments_amount` CHECK(amount_minor > 0)
);
--> statement-breakpoint
CREATE TABLE `tickets` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`yard_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`number` varchar(60) NOT NULL,
	`live_number` varchar(60) GENERATED ALWAYS AS ((if(state = 'void', null, number))) STORED,
	`ticket_on` date NOT NULL,
	`state` enum('draft','posted','paid','void') NOT NULL DEFAULT 'draft',
	`tax_minor` bigint NOT NULL,
	`fee_minor` bigint NOT NULL,
	`difference_minor` bigint NOT NULL,
	`total_minor` bigint NOT NULL,
	`paid_minor` bigint NOT NULL DEFAULT 0,
	`payment_method` enum('cash','check','transfer','card'),
	`paper_says_so` boolean NOT NULL DEFAULT false,
	`note` varchar(2000),
	`version` int NOT NULL DEFAULT 1,
	`made_by` char(36) character set ascii collate ascii_bin NOT NULL,
	`made_at` datetime(3) NOT NULL,
	`posted_by` char(36) character set ascii collate ascii_bin,
	`posted_at` datetime(3),
	`voided_by` char(36) character set ascii collate ascii_bin,
	`voided_at` datetime(3),
	CONSTRAINT `tickets_outfit_id_id_pk` PRIMARY KEY(`outfit_id`,`id`),
	CONSTRAINT `tickets_paper` UNIQUE(`outfit_id`,`yard_id`,`live_number`),
	CONSTRAINT `tickets_paid` CHECK(paid_minor >= 0 and paid_minor <= greatest(total_minor, 0))
);
--> statement-breakpoint
CREATE TABLE `costs` (
	`outfit_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`spent_on` date NOT NULL,
	`kind` enum('fuel','disposal','supplies','repairs','other') NOT NULL,
	`amount_minor` bigint NOT NULL,
	`paid_from` enum('cash','bank','card','own-pocket') NOT NULL,
	`note` varchar(2000),
	`version` int NOT NULL DEFAULT 1,
	`made_by` char(36) character set ascii collate ascii_bin NOT NULL,
	`made_at` datetime(3) NOT NULL,
	`voided_at` datetime(3),
	`voided_by` char(36) character set ascii collate ascii_bin,
	CONSTRAINT `costs_outfit_id_id_pk` PRIMARY KEY(`outfit_id`,`id`),
	CONSTRAINT `costs_amount` CHECK(amount_minor > 0)
);
--> statement-breakpoint
ALTER TABLE `api_keys` ADD CONSTRAINT `api_keys_creator` FOREIGN KEY (`outfit_id`,`created_by`) REFERENCES `memberships`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `audit_log` ADD CONSTRAINT `audit_log_member` FOREIGN KEY (`outfit_id`,`member_id`) REFERENCES `memberships`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `idempotency_keys` ADD CONSTRAINT `idempotency_keys_outfit_id_outfits_id_fk` FOREIGN KEY (`outfit_id`) REFERENCES `outfits`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `invitations` ADD CONSTRAINT `invitations_creator` FOREIGN KEY (`outfit_id`,`created_by`) REFERENCES `memberships`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `memberships` ADD CONSTRAINT `memberships_outfit_id_outfits_id_fk` FOREIGN KEY (`outfit_id`) REFERENCES `outfits`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `memberships` ADD CONSTRAINT `memberships_user_id_users_id_fk` FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `grades` ADD CONSTRAINT `grades_outfit_id_outfits_id_fk` FOREIGN KEY (`outfit_id`) REFERENCES `outfits`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `item_kind_parts` ADD CONSTRAINT `item_kind_parts_kind` FOREIGN KEY (`outfit_id`,`item_kind_id`) REFERENCES `item_kinds`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `item_kinds` ADD CONSTRAINT `item_kinds_outfit_id_outfits_id_fk` FOREIGN KEY (`outfit_id`) REFERENCES `outfits`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `account_balances` ADD CONSTRAINT `account_balances_account` FOREIGN KEY (`outfit_id`,`account`) REFERENCES `accounts`(`outfit_id`,`code`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `account_months` ADD CONSTRAINT `account_months_account` FOREIGN KEY (`outfit_id`,`account`) REFERENCES `accounts`(`outfit_id`,`code`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `accounts` ADD CONSTRAINT `accounts_outfit_id_outfits_id_fk` FOREIGN KEY (`outfit_id`) REFERENCES `outfits`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `book_state` ADD CONSTRAINT `book_state_outfit_id_outfits_id_fk` FOREIGN KEY (`outfit_id`) REFERENCES `outfits`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `entries` ADD CONSTRAINT `entries_reversed` FOREIGN KEY (`outfit_id`,`reverses_id`) REFERENCES `entries`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `entries` ADD CONSTRAINT `entries_maker` FOREIGN KEY (`outfit_id`,`made_by`) REFERENCES `memberships`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `grade_stock` ADD CONSTRAINT `grade_stock_grade` FOREIGN KEY (`outfit_id`,`grade_id`) REFERENCES `grades`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `months` ADD CONSTRAINT `months_outfit_id_outfits_id_fk` FOREIGN KEY (`outfit_id`) REFERENCES `outfits`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `movement_lines` ADD CONSTRAINT `movement_lines_movement` FOREIGN KEY (`outfit_id`,`movement_id`) REFERENCES `movements`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `movement_lines` ADD CONSTRAINT `movement_lines_grade` FOREIGN KEY (`outfit_id`,`grade_id`) REFERENCES `grades`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `movement_lines` ADD CONSTRAINT `movement_lines_bin` FOREIGN KEY (`outfit_id`,`bin_id`,`grade_id`) REFERENCES `bins`(`outfit_id`,`id`,`grade_id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `movement_lines` ADD CONSTRAINT `movement_lines_pickup` FOREIGN KEY (`outfit_id`,`pickup_id`) REFERENCES `pickups`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `movements` ADD CONSTRAINT `movements_reversed` FOREIGN KEY (`outfit_id`,`reverses_id`) REFERENCES `movements`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `movements` ADD CONSTRAINT `movements_maker` FOREIGN KEY (`outfit_id`,`made_by`) REFERENCES `memberships`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `postings` ADD CONSTRAINT `postings_entry` FOREIGN KEY (`outfit_id`,`entry_id`) REFERENCES `entries`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `postings` ADD CONSTRAINT `postings_account_known` FOREIGN KEY (`outfit_id`,`account`) REFERENCES `accounts`(`outfit_id`,`code`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `postings` ADD CONSTRAINT `postings_grade` FOREIGN KEY (`outfit_id`,`grade_id`) REFERENCES `grades`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `postings` ADD CONSTRAINT `postings_yard` FOREIGN KEY (`outfit_id`,`yard_id`) REFERENCES `yards`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `postings` ADD CONSTRAINT `postings_pickup` FOREIGN KEY (`outfit_id`,`pickup_id`) REFERENCES `pickups`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `postings` ADD CONSTRAINT `postings_ticket` FOREIGN KEY (`outfit_id`,`ticket_id`) REFERENCES `tickets`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `postings` ADD CONSTRAINT `postings_member` FOREIGN KEY (`outfit_id`,`member_id`) REFERENCES `memberships`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `lots` ADD CONSTRAINT `lots_pickup` FOREIGN KEY (`outfit_id`,`pickup_id`) REFERENCES `pickups`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `pickup_items` ADD CONSTRAINT `pickup_items_pickup` FOREIGN KEY (`outfit_id`,`pickup_id`) REFERENCES `pickups`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `pickup_items` ADD CONSTRAINT `pickup_items_kind_known` FOREIGN KEY (`outfit_id`,`item_kind_id`) REFERENCES `item_kinds`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `pickups` ADD CONSTRAINT `pickups_maker` FOREIGN KEY (`outfit_id`,`made_by`) REFERENCES `memberships`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `bin_balances` ADD CONSTRAINT `bin_balances_bin` FOREIGN KEY (`outfit_id`,`bin_id`) REFERENCES `bins`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `bins` ADD CONSTRAINT `bins_grade_known` FOREIGN KEY (`outfit_id`,`grade_id`) REFERENCES `grades`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `counts` ADD CONSTRAINT `counts_bin_known` FOREIGN KEY (`outfit_id`,`bin_id`,`grade_id`) REFERENCES `bins`(`outfit_id`,`id`,`grade_id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `counts` ADD CONSTRAINT `counts_maker` FOREIGN KEY (`outfit_id`,`made_by`) REFERENCES `memberships`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `weigh_ins` ADD CONSTRAINT `weigh_ins_bin_known` FOREIGN KEY (`outfit_id`,`bin_id`,`grade_id`) REFERENCES `bins`(`outfit_id`,`id`,`grade_id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `weigh_ins` ADD CONSTRAINT `weigh_ins_pickup_known` FOREIGN KEY (`outfit_id`,`pickup_id`) REFERENCES `pickups`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `weigh_ins` ADD CONSTRAINT `weigh_ins_maker` FOREIGN KEY (`outfit_id`,`made_by`) REFERENCES `memberships`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `grade_aliases` ADD CONSTRAINT `grade_aliases_yard` FOREIGN KEY (`outfit_id`,`yard_id`) REFERENCES `yards`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `grade_aliases` ADD CONSTRAINT `grade_aliases_grade` FOREIGN KEY (`outfit_id`,`grade_id`) REFERENCES `grades`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `price_sheet_lines` ADD CONSTRAINT `price_sheet_lines_sheet` FOREIGN KEY (`outfit_id`,`sheet_id`) REFERENCES `price_sheets`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `price_sheet_lines` ADD CONSTRAINT `price_sheet_lines_grade_known` FOREIGN KEY (`outfit_id`,`grade_id`) REFERENCES `grades`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `price_sheets` ADD CONSTRAINT `price_sheets_yard` FOREIGN KEY (`outfit_id`,`yard_id`) REFERENCES `yards`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `price_sheets` ADD CONSTRAINT `price_sheets_maker` FOREIGN KEY (`outfit_id`,`made_by`) REFERENCES `memberships`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `yards` ADD CONSTRAINT `yards_outfit_id_outfits_id_fk` FOREIGN KEY (`outfit_id`) REFERENCES `outfits`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `ticket_lines` ADD CONSTRAINT `ticket_lines_ticket` FOREIGN KEY (`outfit_id`,`ticket_id`) REFERENCES `tickets`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `ticket_lines` ADD CONSTRAINT `ticket_lines_grade_known` FOREIGN KEY (`outfit_id`,`grade_id`) REFERENCES `grades`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `ticket_lines` ADD CONSTRAINT `ticket_lines_sold_as` FOREIGN KEY (`outfit_id`,`sold_as_grade_id`) REFERENCES `grades`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `ticket_lines` ADD CONSTRAINT `ticket_lines_bin_known` FOREIGN KEY (`outfit_id`,`bin_id`,`grade_id`) REFERENCES `bins`(`outfit_id`,`id`,`grade_id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `ticket_payments` ADD CONSTRAINT `ticket_payments_ticket_known` FOREIGN KEY (`outfit_id`,`ticket_id`) REFERENCES `tickets`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `ticket_payments` ADD CONSTRAINT `ticket_payments_maker` FOREIGN KEY (`outfit_id`,`made_by`) REFERENCES `memberships`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `tickets` ADD CONSTRAINT `tickets_yard` FOREIGN KEY (`outfit_id`,`yard_id`) REFERENCES `yards`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `tickets` ADD CONSTRAINT `tickets_maker` FOREIGN KEY (`outfit_id`,`made_by`) REFERENCES `memberships`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `costs` ADD CONSTRAINT `costs_maker` FOREIGN KEY (`outfit_id`,`made_by`) REFERENCES `memberships`(`outfit_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `audit_log_subject` ON `audit_log` (`outfit_id`,`subject_type`,`subject_id`);--> statement-breakpoint
CREATE INDEX `idempotency_keys_age` ON `idempotency_keys` (`created_at`);--> statement-breakpoint
CREATE INDEX `item_kind_parts_grade` ON `item_kind_parts` (`outfit_id`,`grade`);--> statement-breakpoint
CREATE INDEX `entries_day` ON `entries` (`outfit_id`,`occurred_on`,`sequence`);--> statement-breakpoint
CREATE INDEX `entries_document` ON `entries` (`outfit_id`,`document_type`,`document_id`);--> statement-breakpoint
CREATE INDEX `movement_lines_of_bin` ON `movement_lines` (`outfit_id`,`bin_id`,`grade_id`);--> statement-breakpoint
CREATE INDEX `movement_lines_place` ON `movement_lines` (`outfit_id`,`place`,`occurred_on`,`grade_id`);--> statement-breakpoint
CREATE INDEX `movement_lines_of_pickup` ON `movement_lines` (`outfit_id`,`pickup_id`);--> statement-breakpoint
CREATE INDEX `movements_day` ON `movements` (`outfit_id`,`occurred_on`,`sequence`);--> statement-breakpoint
CREATE INDEX `movements_document` ON `movements` (`outfit_id`,`document_type`,`document_id`);--> statement-breakpoint
CREATE INDEX `postings_account` ON `postings` (`outfit_id`,`account`,`occurred_on`,`grade_id`,`amount_minor`);--> statement-breakpoint
CREATE INDEX `pickup_items_kind` ON `pickup_items` (`outfit_id`,`item_kind_id`);--> statement-breakpoint
CREATE INDEX `pickups_day` ON `pickups` (`outfit_id`,`picked_up_on`,`id`);--> statement-breakpoint
CREATE INDEX `pickups_state` ON `pickups` (`outfit_id`,`state`,`picked_up_on`);--> statement-breakpoint
CREATE INDEX `bins_of_grade` ON `bins` (`outfit_id`,`grade_id`);--> statement-breakpoint
CREATE INDEX `counts_day` ON `counts` (`outfit_id`,`counted_on`,`id`);--> statement-breakpoint
CREATE INDEX `weigh_ins_day` ON `weigh_ins` (`outfit_id`,`weighed_on`,`id`);--> statement-breakpoint
CREATE INDEX `weigh_ins_bin` ON `weigh_ins` (`outfit_id`,`bin_id`,`grade_id`);--> statement-breakpoint
CREATE INDEX `weigh_ins_pickup` ON `weigh_ins` (`outfit_id`,`pickup_id`);--> statement-breakpoint
CREATE INDEX `price_sheet_lines_of_grade` ON `price_sheet_lines` (`outfit_id`,`grade_id`);--> statement-breakpoint
CREATE INDEX `ticket_lines_grade` ON `ticket_lines` (`outfit_id`,`grade_id`);--> statement-breakpoint
CREATE INDEX `ticket_lines_bin` ON `ticket_lines` (`outfit_id`,`bin_id`,`grade_id`);--> statement-breakpoint
CREATE INDEX `ticket_payments_ticket` ON `ticket_payments` (`outfit_id`,`ticket_id`);--> statement-breakpoint
CREATE INDEX `tickets_day` ON `tickets` (`outfit_id`,`ticket_on`,`id`);--> statement-breakpoint
CREATE INDEX `tickets_state` ON `tickets` (`outfit_id`,`state`,`ticket_on`);--> statement-breakpoint
CREATE INDEX `costs_day` ON `costs` (`outfit_id`,`spent_on`,`id`);--> statement-breakpoint
CREATE INDEX `costs_maker_day` ON `costs` (`outfit_id`,`made_by`,`spent_on`);