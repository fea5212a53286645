CREATE TABLE `account` (
	`user_id` varchar(36) NOT NULL,
	`type` varchar(40) NOT NULL,
	`provider` varchar(80) NOT NULL,
	`provider_account_id` varchar(190) NOT NULL,
	`refresh_token` text,
	`access_token` text,
	`expires_at` int,
	`token_type` varchar(40),
	`scope` varchar(255),
	`id_token` text,
	`session_state` varchar(255),
	CONSTRAINT `account_provider_provider_account_id_pk` PRIMARY KEY(`provider`,`provider_account_id`)
);
--> statement-breakpoint
CREATE TABLE `api_token` (
	`id` int AUTO_INCREMENT NOT NULL,
	`user_id` varchar(36) NOT NULL,
	`name` varchar(120) NOT NULL,
	`token_hash` char(64) NOT NULL,
	`scopes` json NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`last_used_at` datetime(3),
	`expires_at` datetime(3),
	`revoked_at` datetime(3),
	CONSTRAINT `api_token_id` PRIMARY KEY(`id`),
	CONSTRAINT `api_token_hash` UNIQUE(`token_hash`)
);
--> statement-breakpoint
CREATE TABLE `audit_event` (
	`id` bigint unsigned AUTO_INCREMENT NOT NULL,
	`at` datetime(3) NOT NULL,
	`actor_id` varchar(36),
	`act` varchar(60) NOT NULL,
	`subject_kind` varchar(40) NOT NULL,
	`subject_id` varchar(60) NOT NULL,
	`before` json,
	`after` json,
	`reason` text,
	CONSTRAINT `audit_event_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `idempotency_key` (
	`user_id` varchar(36) NOT NULL,
	`key` varchar(190) NOT NULL,
	`method` varchar(10) NOT NULL,
	`path` varchar(500) NOT NULL,
	`body_hash` char(64) NOT NULL,
	`status` int,
	`body` mediumtext,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `idempotency_key_user_id_key_pk` PRIMARY KEY(`user_id`,`key`)
);
--> statement-breakpoint
CREATE TABLE `invitation` (
	`id` int AUTO_INCREMENT NOT NULL,
	`email` varchar(254) NOT NULL,
	`name` varchar(160) NOT NULL,
	`roles` json NOT NULL,
	`token_hash` char(64) NOT NULL,
	`invited_by` varchar(36) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`accepted_at` datetime(3),
	`revoked_at` datetime(3),
	CONSTRAINT `invitation_id` PRIMARY KEY(`id`),
	CONSTRAINT `invitation_token` UNIQUE(`token_hash`)
);
--> statement-breakpoint
CREATE TABLE `session` (
	`session_token` varchar(190) NOT NULL,
	`user_id` varchar(36) NOT NULL,
	`expires` datetime(3) NOT NULL,
	CONSTRAINT `session_session_token` PRIMARY KEY(`session_token`)
);
--> statement-breakpoint
CREATE TABLE `setting` (
	`key` varchar(60) NOT NULL,
	`value` json NOT NULL,
	`is_demo` boolean NOT NULL DEFAULT false,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `setting_key` PRIMARY KEY(`key`)
);
--> statement-breakpoint
CREATE TABLE `user` (
	`id` varchar(36) NOT NULL,
	`name` varchar(160) NOT NULL,
	`email` varchar(254) NOT NULL,
	`email_verified` datetime(3),
	`image` varchar(500),
	`password_hash` varchar(255),
	`left_at` datetime(3),
	`created_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `user_id` PRIMARY KEY(`id`),
	CONSTRAINT `user_email` UNIQUE(`email`)
);
--> statement-breakpoint
CREATE TABLE `user_role` (
	`user_id` varchar(36) NOT NULL,
	`role` enum('tester','writer','editor','liaison','admin') NOT NULL,
	CONSTRAINT `user_role_user_id_role_pk` PRIMARY KEY(`user_id`,`role`)
);
--> statement-breakpoint
CREATE TABLE `verification_token` (
	`identifier` varchar(254) NOT NULL,
	`token` varchar(190) NOT NULL,
	`expires` datetime(3) NOT NULL,
	CONSTRAINT `verification_token_identifier_token_pk` PRIMARY KEY(`identifier`,`token`)
);
--> statement-breakpoint
CREATE TABLE `embargo` (
	`id` int AUTO_INCREMENT NOT NULL,
	`sample_id` int NOT NULL,
	`loan_id` int,
	`field` enum('specification','results','everything') NOT NULL,
	`until` datetime(3) NOT NULL,
	`note` text NOT NULL,
	`lifted_at` datetime(3),
	`lifted_by` varchar(36),
	`lift_reason` text,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `embargo_id` PRIMARY KEY(`id`),
	CONSTRAINT `embargo_lift_has_reason` CHECK((`embargo`.`lifted_at` is null) = (`embargo`.`lift_reason` is null))
);
--> statement-breakpoint
CREATE TABLE `loan` (
	`id` int AUTO_INCREMENT NOT NULL,
	`partner_id` int NOT NULL,
	`stage` enum('asked-for','promised','in-transit','here','going-back','returned','kept','lost') NOT NULL,
	`asked_on` date,
	`received_on` date,
	`due_on` date,
	`closed_on` date,
	`terms` text NOT NULL,
	`disclosure` text NOT NULL,
	`value_minor` bigint,
	`currency` char(3),
	`created_by` varchar(36) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `loan_id` PRIMARY KEY(`id`),
	CONSTRAINT `loan_value_has_currency` CHECK((`loan`.`value_minor` is null) = (`loan`.`currency` is null)),
	CONSTRAINT `loan_due_after_receipt` CHECK(`loan`.`due_on` is null or `loan`.`received_on` is null or `loan`.`due_on` >= `loan`.`received_on`)
);
--> statement-breakpoint
CREATE TABLE `loan_reminder` (
	`loan_id` int NOT NULL,
	`kind` varchar(30) NOT NULL,
	`due_on` date NOT NULL,
	`sent_at` datetime(3) NOT NULL,
	CONSTRAINT `loan_reminder_loan_id_kind_due_on_pk` PRIMARY KEY(`loan_id`,`kind`,`due_on`)
);
--> statement-breakpoint
CREATE TABLE `loan_sample` (
	`loan_id` int NOT NULL,
	`sample_id` int NOT NULL,
	CONSTRAINT `loan_sample_loan_id_sample_id_pk` PRIMARY KEY(`loan_id`,`sample_id`)
);
--> statement-breakpoint
CREATE TABLE `part` (
	`id` int AUTO_INCREMENT NOT NULL,
	`slug` varchar(80) NOT NULL,
	`kind` enum('processor','board','memory','cooler','graphics','storage','power-supply','case','other') NOT NULL,
	`maker` varchar(120) NOT NULL,
	`model` varchar(160) NOT NULL,
	`specification` json NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `part_id` PRIMARY KEY(`id`),
	CONSTRAINT `part_slug` UNIQUE(`slug`)
);
--> statement-breakpoint
CREATE TABLE `part_price` (
	`id` int AUTO_INCREMENT NOT NULL,
	`part_id` int NOT NULL,
	`amount_minor` bigint NOT NULL,
	`currency` char(3) NOT NULL,
	`observed_on` date NOT NULL,
	`source` varchar(200) NOT NULL DEFAULT '',
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `part_price_id` PRIMARY KEY(`id`),
	CONSTRAINT `part_price_not_negative` CHECK(`part_price`.`amount_minor` >= 0),
	CONSTRAINT `part_price_currency` CHECK(`part_price`.`currency` regexp '^[A-Z]{3}$')
);
--> statement-breakpoint
CREATE TABLE `partner` (
	`id` int AUTO_INCREMENT NOT NULL,
	`slug` varchar(80) NOT NULL,
	`name` varchar(160) NOT NULL,
	`contact_name` varchar(160) NOT NULL DEFAULT '',
	`contact_email` varchar(254) NOT NULL DEFAULT '',
	`notes` text NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `partner_id` PRIMARY KEY(`id`),
	CONSTRAINT `partner_slug` UNIQUE(`slug`)
);
--> statement-breakpoint
CREATE TABLE `sample` (
	`id` int AUTO_INCREMENT NOT NULL,
	`slug` varchar(80) NOT NULL,
	`part_id` int NOT NULL,
	`serial` varchar(120) NOT NULL DEFAULT '',
	`provenance` enum('bought','loaned','given','pre-production') NOT NULL,
	`condition` varchar(300) NOT NULL DEFAULT '',
	`place` varchar(160) NOT NULL DEFAULT '',
	`created_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `sample_id` PRIMARY KEY(`id`),
	CONSTRAINT `sample_slug` UNIQUE(`slug`)
);
--> statement-breakpoint
CREATE TABLE `campaign` (
	`id` int AUTO_INCREMENT NOT NULL,
	`slug` varchar(80) NOT NULL,
	`name` varchar(160) NOT NULL,
	`rig_revision_id` int NOT NULL,
	`purpose` text NOT NULL,
	`due_at` datetime(3),
	`created_by` varchar(36) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`archived_at` datetime(3),
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `campaign_id` PRIMARY KEY(`id`),
	CONSTRAINT `campaign_slug` UNIQUE(`slug`)
);
--> statement-breakpoint
CREATE TABLE `campaign_profile` (
	`campaign_id` int NOT NULL,
	`profile_id` int NOT NULL,
	`position` int NOT NULL,
	CONSTRAINT `campaign_profile_campaign_id_profile_id_pk` PRIMARY KEY(`campaign_id`,`profile_id`)
);
--> statement-breakpoint
CREATE TABLE `campaign_workload` (
	`campaign_id` int NOT NULL,
	`workload_id` int NOT NULL,
	`position` int NOT NULL,
	`repeats` int NOT NULL,
	CONSTRAINT `campaign_workload_campaign_id_workload_id_pk` PRIMARY KEY(`campaign_id`,`workload_id`),
	CONSTRAINT `campaign_workload_repeats` CHECK(`campaign_workload`.`repeats` between 1 and 1000)
);
--> statement-breakpoint
CREATE TABLE `cell_signature` (
	`id` int AUTO_INCREMENT NOT NULL,
	`campaign_id` int NOT NULL,
	`profile_id` int NOT NULL,
	`workload_id` int NOT NULL,
	`signed_by` varchar(36) NOT NULL,
	`signed_at` datetime(3) NOT NULL,
	`removed_at` datetime(3),
	`removed_reason` varchar(300),
	`standing` varchar(40) GENERATED ALWAYS AS ((case when removed_at is null then concat(campaign_id, '/', profile_id, '/', workload_id) else null end)) VIRTUAL,
	CONSTRAINT `cell_signature_id` PRIMARY KEY(`id`),
	CONSTRAINT `cell_signature_standing` UNIQUE(`standing`),
	CONSTRAINT `cell_signature_removal` CHECK((`cell_signature`.`removed_at` is null) = (`cell_signature`.`removed_reason` is null))
);
--> statement-breakpoint
CREATE TABLE `profile` (
	`id` int AUTO_INCREMENT NOT NULL,
	`rig_id` int NOT NULL,
	`slug` varchar(80) NOT NULL,
	`name` varchar(160) NOT NULL,
	`parent_id` int,
	`notes` text NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	`root_of` int GENERATED ALWAYS AS ((case when parent_id is null then rig_id else null end)) VIRTUAL,
	CONSTRAINT `profile_id` PRIMARY KEY(`id`),
	CONSTRAINT `profile_slug` UNIQUE(`rig_id`,`slug`),
	CONSTRAINT `profile_root` UNIQUE(`root_of`),
	CONSTRAINT `profile_in_rig` UNIQUE(`id`,`rig_id`)
);
--> statement-breakpoint
CREATE TABLE `profile_setting` (
	`id` int AUTO_INCREMENT NOT NULL,
	`profile_id` int NOT NULL,
	`position` int NOT NULL,
	`menu_path` varchar(300) NOT NULL,
	`setting` varchar(160) NOT NULL,
	`value` varchar(80) NOT NULL,
	`unit` varchar(20) NOT NULL DEFAULT '',
	`quantity` enum('reference-clock','core-ratio','core-clock','core-voltage','memory-data-rate','memory-voltage','cas-latency','fabric-clock','memory-controller-clock','power-limit','current-limit','temperature-limit','load-line','switch-current','other') NOT NULL DEFAULT 'other',
	`note` varchar(500) NOT NULL DEFAULT '',
	CONSTRAINT `profile_setting_id` PRIMARY KEY(`id`),
	CONSTRAINT `profile_setting_position` UNIQUE(`profile_id`,`position`)
);
--> statement-breakpoint
CREATE TABLE `reading` (
	`id` bigint unsigned AUTO_INCREMENT NOT NULL,
	`run_id` bigint unsigned NOT NULL,
	`position` int NOT NULL,
	`value` double NOT NULL,
	`client_key` varchar(80),
	`created_at` datetime(3) NOT NULL,
	`excluded_at` datetime(3),
	`excluded_by` varchar(36),
	`exclude_reason` varchar(500),
	CONSTRAINT `reading_id` PRIMARY KEY(`id`),
	CONSTRAINT `reading_position` UNIQUE(`run_id`,`position`),
	CONSTRAINT `reading_client_key` UNIQUE(`run_id`,`client_key`),
	CONSTRAINT `reading_exclusion_has_reason` CHECK((`reading`.`excluded_at` is null) = (`reading`.`exclude_reason` is null))
);
--> statement-breakpoint
CREATE TABLE `rig` (
	`id` int AUTO_INCREMENT NOT NULL,
	`slug` varchar(80) NOT NULL,
	`name` varchar(160) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `rig_id` PRIMARY KEY(`id`),
	CONSTRAINT `rig_slug` UNIQUE(`slug`)
);
--> statement-breakpoint
CREATE TABLE `rig_revision` (
	`id` int AUTO_INCREMENT NOT NULL,
	`rig_id` int NOT NULL,
	`number` int NOT NULL,
	`firmware` varchar(160) NOT NULL DEFAULT '',
	`driver` varchar(160) NOT NULL DEFAULT '',
	`os` varchar(160) NOT NULL DEFAULT '',
	`change` text NOT NULL,
	`created_by` varchar(36) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `rig_revision_id` PRIMARY KEY(`id`),
	CONSTRAINT `rig_revision_number` UNIQUE(`rig_id`,`number`)
);
--> statement-breakpoint
CREATE TABLE `rig_sample` (
	`rig_revision_id` int NOT NULL,
	`sample_id` int NOT NULL,
	`position` int NOT NULL,
	CONSTRAINT `rig_sample_rig_revision_id_sample_id_pk` PRIMARY KEY(`rig_revision_id`,`sample_id`)
);
--> statement-breakpoint
CREATE TABLE `run` (
	`id` bigint unsigned AUTO_INCREMENT NOT NULL,
	`campaign_id` int NOT NULL,
	`profile_id` int NOT NULL,
	`workload_id` int NOT NULL,
	`tester_id` varchar(36) NOT NULL,
	`source` enum('grid','csv','api') NOT NULL,
	`client_key` varchar(80),
	`started_at` datetime(3) NOT NULL,
	`ambient_c` double,
	`notes` text NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`voided_at` datetime(3),
	`voided_by` varchar(36),
	`void_reason` varchar(500),
	CONSTRAINT `run_id` PRIMARY KEY(`id`),
	CONSTRAINT `run_client_key` UNIQUE(`tester_id`,`client_key`),
	CONSTRAINT `run_void_has_reason` CHECK((`run`.`voided_at` is null) = (`run`.`void_reason` is null)),
	CONSTRAINT `run_ambient` CHECK(`run`.`ambient_c` is null or `run`.`ambient_c` between -60 and 100)
);
--> statement-breakpoint
CREATE TABLE `workload` (
	`id` int AUTO_INCREMENT NOT NULL,
	`slug` varchar(80) NOT NULL,
	`name` varchar(160) NOT NULL,
	`program_version` varchar(80) NOT NULL DEFAULT '',
	`settings` text NOT NULL,
	`quantity` varchar(80) NOT NULL,
	`unit` varchar(40) NOT NULL,
	`better` enum('higher','lower') NOT NULL,
	`class` enum('light-threaded','all-core','game','memory','stress') NOT NULL,
	`warm_ups` int NOT NULL DEFAULT 1,
	`repeats` int NOT NULL DEFAULT 5,
	`cool_down_s` int NOT NULL DEFAULT 0,
	`least_difference_percent` decimal(6,3) NOT NULL,
	`headline` enum('mean','median') NOT NULL DEFAULT 'mean',
	`created_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `workload_id` PRIMARY KEY(`id`),
	CONSTRAINT `workload_slug` UNIQUE(`slug`),
	CONSTRAINT `workload_protocol` CHECK(`workload`.`warm_ups` >= 0 and `workload`.`repeats` between 1 and 1000 and `workload`.`cool_down_s` >= 0),
	CONSTRAINT `workload_least_difference` CHECK(`workload`.`least_difference_percent` > 0 and `workload`.`least_difference_percent` < 100)
);
--> statement-breakpoint
CREATE TABLE `article` (
	`id` int AUTO_INCREMENT NOT NULL,
	`slug` varchar(80) NOT NULL,
	`title` varchar(200) NOT NULL,
	`standfirst` varchar(500) NOT NULL DEFAULT '',
	`template` varchar(60) NOT NULL,
	`stage` enum('drafting','in-review','changes-asked','approved','scheduled','published','withdrawn') NOT NULL,
	`author_id` varchar(36) NOT NULL,
	`head` int NOT NULL DEFAULT 0,
	`slot_at` datetime(3),
	`approved_edition_id` int,
	`live_edition_id` int,
	`first_published_at` datetime(3),
	`withdrawn_at` datetime(3),
	`withdraw_reason` text,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `article_id` PRIMARY KEY(`id`),
	CONSTRAINT `article_slug` UNIQUE(`slug`),
	CONSTRAINT `article_slot` CHECK(`article`.`stage` <> 'scheduled' or (`article`.`slot_at` is not null and `article`.`approved_edition_id` is not null)),
	CONSTRAINT `article_approved` CHECK(`article`.`stage` <> 'approved' or `article`.`approved_edition_id` is not null),
	CONSTRAINT `article_published` CHECK(`article`.`stage` <> 'published' or (`article`.`live_edition_id` is not null and `article`.`first_published_at` is not null)),
	CONSTRAINT `article_withdrawn` CHECK((`article`.`withdrawn_at` is null) = (`article`.`withdraw_reason` is null))
);
--> statement-breakpoint
CREATE TABLE `article_campaign` (
	`article_id` int NOT NULL,
	`campaign_id` int NOT NULL,
	`position` int NOT NULL,
	CONSTRAINT `article_campaign_article_id_campaign_id_pk` PRIMARY KEY(`article_id`,`campaign_id`)
);
--> statement-breakpoint
CREATE TABLE `comment` (
	`id` int AUTO_INCREMENT NOT NULL,
	`article_id` int NOT NULL,
	`revision_number` int NOT NULL,
	`quote` text NOT NULL,
	`body` text NOT NULL,
	`blocking` boolean NOT NULL DEFAULT false,
	`author_id` varchar(36) NOT NULL,
	`parent_id` int,
	`created_at` datetime(3) NOT NULL,
	`resolved_at` datetime(3),
	`resolved_by` varchar(36),
	CONSTRAINT `comment_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `correction` (
	`id` int AUTO_INCREMENT NOT NULL,
	`article_id` int NOT NULL,
	`edition_id` int,
	`kind` enum('correction','clarification','update','withdrawal') NOT NULL,
	`body` text NOT NULL,
	`made_by` varchar(36) NOT NULL,
	`made_at` datetime(3) NOT NULL,
	CONSTRAINT `correction_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `edition` (
	`id` int AUTO_INCREMENT NOT NULL,
	`article_id` int NOT NULL,
	`number` int NOT NULL,
	`revision_id` int NOT NULL,
	`title` varchar(200) NOT NULL,
	`standfirst` varchar(500) NOT NULL,
	`source` mediumtext NOT NULL,
	`data` mediumtext NOT NULL,
	`page` mediumtext NOT NULL,
	`plain` mediumtext NOT NULL,
	`author_name` varchar(160) NOT NULL,
	`tester_names` json NOT NULL,
	`hash` char(64) NOT NULL,
	`approved_by` varchar(36) NOT NULL,
	`approved_at` datetime(3) NOT NULL,
	`published_at` datetime(3),
	CONSTRAINT `edition_id` PRIMARY KEY(`id`),
	CONSTRAINT `edition_number` UNIQUE(`article_id`,`number`)
);
--> statement-breakpoint
CREATE TABLE `edition_part` (
	`edition_id` int NOT NULL,
	`part_id` int NOT NULL,
	CONSTRAINT `edition_part_edition_id_part_id_pk` PRIMARY KEY(`edition_id`,`part_id`)
);
--> statement-breakpoint
CREATE TABLE `edition_result` (
	`id` bigint unsigned AUTO_INCREMENT NOT NULL,
	`edition_id` int NOT NULL,
	`campaign_slug` varchar(80) NOT NULL,
	`rig_name` varchar(160) NOT NULL,
	`rig_revision` int NOT NULL,
	`profile_slug` varchar(80) NOT NULL,
	`profile_name` varchar(160) NOT NULL,
	`workload_slug` varchar(80) NOT NULL,
	`workload_name` varchar(160) NOT NULL,
	`unit` varchar(40) NOT NULL,
	`better` varchar(10) NOT NULL,
	`figures` json NOT NULL,
	CONSTRAINT `edition_result_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `plate` (
	`edition_id` int NOT NULL,
	`key` varchar(60) NOT NULL,
	`kind` varchar(30) NOT NULL,
	`title` varchar(200) NOT NULL,
	`svg` mediumtext NOT NULL,
	`csv` mediumtext NOT NULL,
	CONSTRAINT `plate_edition_id_key_pk` PRIMARY KEY(`edition_id`,`key`)
);
--> statement-breakpoint
CREATE TABLE `revision` (
	`id` int AUTO_INCREMENT NOT NULL,
	`article_id` int NOT NULL,
	`number` int NOT NULL,
	`title` varchar(200) NOT NULL,
	`standfirst` varchar(500) NOT NULL,
	`source` mediumtext NOT NULL,
	`saved_by` varchar(36) NOT NULL,
	`saved_at` datetime(3) NOT NULL,
	`note` varchar(200) NOT NULL DEFAULT '',
	CONSTRAINT `revision_id` PRIMARY KEY(`id`),
	CONSTRAINT `revision_number` UNIQUE(`article_id`,`number`)
);
--> statement-breakpoint
CREATE TABLE `job` (
	`id` bigint unsigned AUTO_INCREMENT NOT NULL,
	`kind` varchar(60) NOT NULL,
	`payload` json NOT NULL,
	`dedupe_key` varchar(190),
	`state` enum('waiting','done','dead') NOT NULL DEFAULT 'waiting',
	`run_at` datetime(3) NOT NULL,
	`attempts` int NOT NULL DEFAULT 0,
	`max_attempts` int NOT NULL DEFAULT 8,
	`leased_until` datetime(3),
	`leased_by` varchar(80),
	`last_error` text,
	`created_at` datetime(3) NOT NULL,
	`finished_at` datetime(3),
	CONSTRAINT `job_id` PRIMARY KEY(`id`),
	CONSTRAINT `job_dedupe` UNIQUE(`dedupe_key`)
);
--> statement-breakpoint
CREATE TABLE `mail` (
	`id` bigint unsigned AUTO_INCREMENT NOT NULL,
	`message_id` varchar(190) NOT NULL,
	`recipient` varchar(254) NOT NULL,
	`subject` varchar(300) NOT NULL,
	`text_body` mediumtext NOT NULL,
	`html_body` mediumtext NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`sent_at` datetime(3),
	CONSTRAINT `mail_id` PRIMARY KEY(`id`),
	CONSTRAINT `mail_message_id` UNIQUE(`message_id`)
);
--> statement-breakpoint
CREATE TABLE `rate_limit` (
	`key` varchar(255) NOT NULL,
	`points` int NOT NULL DEFAULT 0,
	`expire` bigint unsigned,
	CONSTRAINT `rate_limit_key` PRIMARY KEY(`key`)
);
--> statement-breakpoint
ALTER TABLE `account` ADD CONSTRAINT `account_user_id_user_id_fk` FOREIGN KEY (`user_id`) REFERENCES `user`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `api_token` ADD CONSTRAINT `api_token_user_id_user_id_fk` FOREIGN KEY (`user_id`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `audit_event` ADD CONSTRAINT `audit_event_actor_id_user_id_fk` FOREIGN KEY (`actor_id`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `idempotency_key` ADD CONSTRAINT `idempotency_key_user_id_user_id_fk` FOREIGN KEY (`user_id`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `invitation` ADD CONSTRAINT `invitation_invited_by_user_id_fk` FOREIGN KEY (`invited_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `session` ADD CONSTRAINT `session_user_id_user_id_fk` FOREIGN KEY (`user_id`) REFERENCES `user`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `user_role` ADD CONSTRAINT `user_role_user_id_user_id_fk` FOREIGN KEY (`user_id`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `embargo` ADD CONSTRAINT `embargo_sample_id_sample_id_fk` FOREIGN KEY (`sample_id`) REFERENCES `sample`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `embargo` ADD CONSTRAINT `embargo_loan_id_loan_id_fk` FOREIGN KEY (`loan_id`) REFERENCES `loan`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `embargo` ADD CONSTRAINT `embargo_lifted_by_user_id_fk` FOREIGN KEY (`lifted_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `loan` ADD CONSTRAINT `loan_partner_id_partner_id_fk` FOREIGN KEY (`partner_id`) REFERENCES `partner`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `loan` ADD CONSTRAINT `loan_created_by_user_id_fk` FOREIGN KEY (`created_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `loan_reminder` ADD CONSTRAINT `loan_reminder_loan_id_loan_id_fk` FOREIGN KEY (`loan_id`) REFERENCES `loan`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `loan_sample` ADD CONSTRAINT `loan_sample_loan_id_loan_id_fk` FOREIGN KEY (`loan_id`) REFERENCES `loan`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `loan_sample` ADD CONSTRAINT `loan_sample_sample_id_sample_id_fk` FOREIGN KEY (`sample_id`) REFERENCES `sample`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `part_price` ADD CONSTRAINT `part_price_part_id_part_id_fk` FOREIGN KEY (`part_id`) REFERENCES `part`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sample` ADD CONSTRAINT `sample_part_id_part_id_fk` FOREIGN KEY (`part_id`) REFERENCES `part`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `campaign` ADD CONSTRAINT `campaign_rig_revision_id_rig_revision_id_fk` FOREIGN KEY (`rig_revision_id`) REFERENCES `rig_revision`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `campaign` ADD CONSTRAINT `campaign_created_by_user_id_fk` FOREIGN KEY (`created_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `campaign_profile` ADD CONSTRAINT `campaign_profile_campaign_id_campaign_id_fk` FOREIGN KEY (`campaign_id`) REFERENCES `campaign`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `campaign_profile` ADD CONSTRAINT `campaign_profile_profile_id_profile_id_fk` FOREIGN KEY (`profile_id`) REFERENCES `profile`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `campaign_workload` ADD CONSTRAINT `campaign_workload_campaign_id_campaign_id_fk` FOREIGN KEY (`campaign_id`) REFERENCES `campaign`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `campaign_workload` ADD CONSTRAINT `campaign_workload_workload_id_workload_id_fk` FOREIGN KEY (`workload_id`) REFERENCES `workload`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `cell_signature` ADD CONSTRAINT `cell_signature_signed_by_user_id_fk` FOREIGN KEY (`signed_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `cell_signature` ADD CONSTRAINT `cell_signature_profile` FOREIGN KEY (`campaign_id`,`profile_id`) REFERENCES `campaign_profile`(`campaign_id`,`profile_id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `cell_signature` ADD CONSTRAINT `cell_signature_workload` FOREIGN KEY (`campaign_id`,`workload_id`) REFERENCES `campaign_workload`(`campaign_id`,`workload_id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `profile` ADD CONSTRAINT `profile_rig_id_rig_id_fk` FOREIGN KEY (`rig_id`) REFERENCES `rig`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `profile` ADD CONSTRAINT `profile_parent_same_rig` FOREIGN KEY (`parent_id`,`rig_id`) REFERENCES `profile`(`id`,`rig_id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `profile_setting` ADD CONSTRAINT `profile_setting_profile_id_profile_id_fk` FOREIGN KEY (`profile_id`) REFERENCES `profile`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `reading` ADD CONSTRAINT `reading_run_id_run_id_fk` FOREIGN KEY (`run_id`) REFERENCES `run`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `reading` ADD CONSTRAINT `reading_excluded_by_user_id_fk` FOREIGN KEY (`excluded_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `rig_revision` ADD CONSTRAINT `rig_revision_rig_id_rig_id_fk` FOREIGN KEY (`rig_id`) REFERENCES `rig`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `rig_revision` ADD CONSTRAINT `rig_revision_created_by_user_id_fk` FOREIGN KEY (`created_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `rig_sample` ADD CONSTRAINT `rig_sample_rig_revision_id_rig_revision_id_fk` FOREIGN KEY (`rig_revision_id`) REFERENCES `rig_revision`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `rig_sample` ADD CONSTRAINT `rig_sample_sample_id_sample_id_fk` FOREIGN KEY (`sample_id`) REFERENCES `sample`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `run` ADD CONSTRAINT `run_tester_id_user_id_fk` FOREIGN KEY (`tester_id`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `run` ADD CONSTRAINT `run_voided_by_user_id_fk` FOREIGN KEY (`voided_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `run` ADD CONSTRAINT `run_profile` FOREIGN KEY (`campaign_id`,`profile_id`) REFERENCES `campaign_profile`(`campaign_id`,`profile_id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `run` ADD CONSTRAINT `run_workload_in_campaign` FOREIGN KEY (`campaign_id`,`workload_id`) REFERENCES `campaign_workload`(`campaign_id`,`workload_id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `article` ADD CONSTRAINT `article_author_id_user_id_fk` FOREIGN KEY (`author_id`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `article_campaign` ADD CONSTRAINT `article_campaign_article_id_article_id_fk` FOREIGN KEY (`article_id`) REFERENCES `article`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `article_campaign` ADD CONSTRAINT `article_campaign_campaign_id_campaign_id_fk` FOREIGN KEY (`campaign_id`) REFERENCES `campaign`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `comment` ADD CONSTRAINT `comment_article_id_article_id_fk` FOREIGN KEY (`article_id`) REFERENCES `article`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `comment` ADD CONSTRAINT `comment_author_id_user_id_fk` FOREIGN KEY (`author_id`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `comment` ADD CONSTRAINT `comment_resolved_by_user_id_fk` FOREIGN KEY (`resolved_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `comment` ADD CONSTRAINT `comment_thread` FOREIGN KEY (`parent_id`) REFERENCES `comment`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `correction` ADD CONSTRAINT `correction_article_id_article_id_fk` FOREIGN KEY (`article_id`) REFERENCES `article`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `correction` ADD CONSTRAINT `correction_edition_id_edition_id_fk` FOREIGN KEY (`edition_id`) REFERENCES `edition`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `correction` ADD CONSTRAINT `correction_made_by_user_id_fk` FOREIGN KEY (`made_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `edition` ADD CONSTRAINT `edition_article_id_article_id_fk` FOREIGN KEY (`article_id`) REFERENCES `article`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `edition` ADD CONSTRAINT `edition_revision_id_revision_id_fk` FOREIGN KEY (`revision_id`) REFERENCES `revision`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `edition` ADD CONSTRAINT `edition_approved_by_user_id_fk` FOREIGN KEY (`approved_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `edition_part` ADD CONSTRAINT `edition_part_edition_id_edition_id_fk` FOREIGN KEY (`edition_id`) REFERENCES `edition`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `edition_part` ADD CONSTRAINT `edition_part_part_id_part_id_fk` FOREIGN KEY (`part_id`) REFERENCES `part`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `edition_result` ADD CONSTRAINT `edition_result_edition_id_edition_id_fk` FOREIGN KEY (`edition_id`) REFERENCES `edition`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `plate` ADD CONSTRAINT `plate_edition_id_edition_id_fk` FOREIGN KEY (`edition_id`) REFERENCES `edition`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `revision` ADD CONSTRAINT `revision_article_id_article_id_fk` FOREIGN KEY (`article_id`) REFERENCES `article`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `revision` ADD CONSTRAINT `revision_saved_by_user_id_fk` FOREIGN KEY (`saved_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `api_token_user` ON `api_token` (`user_id`);--> statement-breakpoint
CREATE INDEX `audit_subject` ON `audit_event` (`subject_kind`,`subject_id`,`id`);--> statement-breakpoint
CREATE INDEX `audit_at` ON `audit_event` (`at`);--> statement-breakpoint
CREATE INDEX `audit_actor` ON `audit_event` (`actor_id`,`id`);--> statement-breakpoint
CREATE INDEX `idempotency_created` ON `idempotency_key` (`created_at`);--> statement-breakpoint
CREATE INDEX `invitation_email` ON `invitation` (`email`);--> statement-breakpoint
CREATE INDEX `session_user` ON `session` (`user_id`);--> statement-breakpoint
CREATE INDEX `user_role_role` ON `user_role` (`role`);--> statement-breakpoint
CREATE INDEX `embargo_sample` ON `embargo` (`sample_id`,`until`);--> statement-breakpoint
CREATE INDEX `embargo_loan` ON `embargo` (`loan_id`);--> statement-breakpoint
CREATE INDEX `loan_partner` ON `loan` (`partner_id`);--> statement-breakpoint
CREATE INDEX `loan_due` ON `loan` (`stage`,`due_on`);--> statement-breakpoint
CREATE INDEX `loan_sample_sample` ON `loan_sample` (`sample_id`);--> statement-breakpoint
CREATE INDEX `part_kind` ON `part` (`kind`,`maker`,`model`);--> statement-breakpoint
CREATE INDEX `part_price_latest` ON `part_price` (`part_id`,`observed_on`);--> statement-breakpoint
CREATE INDEX `partner_name` ON `partner` (`name`);--> statement-breakpoint
CREATE INDEX `sample_part` ON `sample` (`part_id`);--> statement-breakpoint
CREATE INDEX `campaign_list` ON `campaign` (`archived_at`,`created_at`);--> statement-breakpoint
CREATE INDEX `campaign_rig` ON `campaign` (`rig_revision_id`);--> statement-breakpoint
CREATE INDEX `campaign_profile_profile` ON `campaign_profile` (`profile_id`);--> statement-breakpoint
CREATE INDEX `campaign_workload_workload` ON `campaign_workload` (`workload_id`);--> statement-breakpoint
CREATE INDEX `cell_signature_cell` ON `cell_signature` (`campaign_id`,`profile_id`,`workload_id`);--> statement-breakpoint
CREATE INDEX `profile_parent` ON `profile` (`parent_id`);--> statement-breakpoint
CREATE INDEX `rig_sample_sample` ON `rig_sample` (`sample_id`);--> statement-breakpoint
CREATE INDEX `run_cell` ON `run` (`campaign_id`,`profile_id`,`workload_id`,`id`);--> statement-breakpoint
CREATE INDEX `run_workload` ON `run` (`workload_id`);--> statement-breakpoint
CREATE INDEX `run_tester` ON `run` (`tester_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `workload_class` ON `workload` (`class`,`name`);--> statement-breakpoint
CREATE INDEX `article_stage` ON `article` (`stage`,`slot_at`);--> statement-breakpoint
CREATE INDEX `article_author` ON `article` (`author_id`);--> statement-breakpoint
CREATE INDEX `article_published` ON `article` (`live_edition_id`,`first_published_at`);--> statement-breakpoint
CREATE INDEX `article_campaign_campaign` ON `article_campaign` (`campaign_id`);--> statement-breakpoint
CREATE INDEX `comment_article` ON `comment` (`article_id`,`id`);--> statement-breakpoint
CREATE INDEX `comment_parent` ON `comment` (`parent_id`);--> statement-breakpoint
CREATE INDEX `correction_article` ON `correction` (`article_id`);--> statement-breakpoint
CREATE INDEX `correction_at` ON `correction` (`made_at`);--> statement-breakpoint
CREATE INDEX `edition_published` ON `edition` (`published_at`);--> statement-breakpoint
CREATE INDEX `edition_part_part` ON `edition_part` (`part_id`);--> statement-breakpoint
CREATE INDEX `edition_result_edition` ON `edition_result` (`edition_id`);--> statement-breakpoint
CREATE INDEX `edition_result_workload` ON `edition_result` (`workload_slug`);--> statement-breakpoint
CREATE INDEX `job_due` ON `job` (`state`,`run_at`);--> statement-breakpoint
CREATE INDEX `job_kind` ON `job` (`kind`,`id`);--> statement-breakpoint
CREATE INDEX `mail_unsent` ON `mail` (`sent_at`,`id`);