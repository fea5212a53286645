CREATE TABLE `instrument` (
	`id` int AUTO_INCREMENT NOT NULL,
	`slug` varchar(80) NOT NULL,
	`name` varchar(160) NOT NULL,
	`serial` varchar(120) NOT NULL DEFAULT '',
	`quantity` varchar(80) NOT NULL,
	`unit` varchar(40) NOT NULL,
	`accuracy_percent` decimal(8,5) NOT NULL,
	`accuracy_absolute` double NOT NULL,
	`resolution` double NOT NULL,
	`calibrated_on` date,
	`calibration_due_on` date,
	`accuracy_source` varchar(200) NOT NULL DEFAULT '',
	`created_at` datetime(3) NOT NULL,
	`retired_at` datetime(3),
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `instrument_id` PRIMARY KEY(`id`),
	CONSTRAINT `instrument_slug` UNIQUE(`slug`),
	CONSTRAINT `instrument_accuracy` CHECK(`instrument`.`accuracy_percent` >= 0 and `instrument`.`accuracy_absolute` >= 0 and `instrument`.`resolution` >= 0)
);
--> statement-breakpoint
CREATE TABLE `attempt` (
	`id` bigint unsigned AUTO_INCREMENT NOT NULL,
	`ladder_id` int NOT NULL,
	`workload_id` int NOT NULL,
	`clock_mhz` double NOT NULL,
	`volts` decimal(7,4) NOT NULL,
	`duration_min` double NOT NULL,
	`outcome` enum('passed','failed','stopped') NOT NULL,
	`failure` varchar(200) NOT NULL DEFAULT '',
	`errors` int NOT NULL DEFAULT 0,
	`peak_temp_c` double,
	`package_w` double,
	`ambient_c` double,
	`notes` varchar(1000) NOT NULL DEFAULT '',
	`tester_id` varchar(36) NOT NULL,
	`client_key` varchar(80),
	`started_at` datetime(3) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`voided_at` datetime(3),
	`voided_by` varchar(36),
	`void_reason` varchar(500),
	CONSTRAINT `attempt_id` PRIMARY KEY(`id`),
	CONSTRAINT `attempt_client_key` UNIQUE(`tester_id`,`client_key`),
	CONSTRAINT `attempt_figures` CHECK(`attempt`.`clock_mhz` > 0 and `attempt`.`volts` > 0 and `attempt`.`duration_min` >= 0 and `attempt`.`errors` >= 0),
	CONSTRAINT `attempt_failure` CHECK(`attempt`.`outcome` <> 'failed' or `attempt`.`failure` <> ''),
	CONSTRAINT `attempt_void_has_reason` CHECK((`attempt`.`voided_at` is null) = (`attempt`.`void_reason` is null))
);
--> statement-breakpoint
CREATE TABLE `ladder` (
	`id` int AUTO_INCREMENT NOT NULL,
	`slug` varchar(80) NOT NULL,
	`name` varchar(160) NOT NULL,
	`rig_revision_id` int NOT NULL,
	`profile_id` int NOT NULL,
	`purpose` text NOT NULL,
	`step_mhz` int NOT NULL,
	`limit_clock_mhz` int NOT NULL,
	`limit_volts` decimal(7,4) NOT NULL,
	`limit_temp_c` double NOT NULL,
	`limit_source` varchar(200) NOT NULL,
	`created_by` varchar(36) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`archived_at` datetime(3),
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `ladder_id` PRIMARY KEY(`id`),
	CONSTRAINT `ladder_slug` UNIQUE(`slug`),
	CONSTRAINT `ladder_step` CHECK(`ladder`.`step_mhz` between 1 and 1000),
	CONSTRAINT `ladder_limits` CHECK(`ladder`.`limit_clock_mhz` > 0 and `ladder`.`limit_volts` > 0 and `ladder`.`limit_temp_c` > 0)
);
--> statement-breakpoint
CREATE TABLE `ladder_stress` (
	`ladder_id` int NOT NULL,
	`workload_id` int NOT NULL,
	`kind` enum('heaviest','everyday') NOT NULL,
	`minutes` int NOT NULL,
	`position` int NOT NULL,
	CONSTRAINT `ladder_stress_ladder_id_workload_id_pk` PRIMARY KEY(`ladder_id`,`workload_id`),
	CONSTRAINT `ladder_stress_minutes` CHECK(`ladder_stress`.`minutes` between 1 and 100000)
);
--> statement-breakpoint
CREATE TABLE `sweep` (
	`id` int AUTO_INCREMENT NOT NULL,
	`slug` varchar(80) NOT NULL,
	`name` varchar(160) NOT NULL,
	`rig_revision_id` int NOT NULL,
	`profile_id` int NOT NULL,
	`workload_id` int NOT NULL,
	`purpose` text NOT NULL,
	`wanted_clock_mhz` double NOT NULL,
	`current_step_a` double NOT NULL,
	`created_by` varchar(36) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`archived_at` datetime(3),
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `sweep_id` PRIMARY KEY(`id`),
	CONSTRAINT `sweep_slug` UNIQUE(`slug`),
	CONSTRAINT `sweep_figures` CHECK(`sweep`.`wanted_clock_mhz` > 0 and `sweep`.`current_step_a` > 0)
);
--> statement-breakpoint
CREATE TABLE `sweep_pass` (
	`id` bigint unsigned AUTO_INCREMENT NOT NULL,
	`sweep_id` int NOT NULL,
	`number` int NOT NULL,
	`tester_id` varchar(36) NOT NULL,
	`client_key` varchar(80),
	`started_at` datetime(3) NOT NULL,
	`ambient_c` double,
	`notes` varchar(1000) NOT NULL DEFAULT '',
	`created_at` datetime(3) NOT NULL,
	`voided_at` datetime(3),
	`voided_by` varchar(36),
	`void_reason` varchar(500),
	CONSTRAINT `sweep_pass_id` PRIMARY KEY(`id`),
	CONSTRAINT `sweep_pass_number` UNIQUE(`sweep_id`,`number`),
	CONSTRAINT `sweep_pass_client_key` UNIQUE(`tester_id`,`client_key`),
	CONSTRAINT `sweep_pass_void_has_reason` CHECK((`sweep_pass`.`voided_at` is null) = (`sweep_pass`.`void_reason` is null))
);
--> statement-breakpoint
CREATE TABLE `sweep_point` (
	`pass_id` bigint unsigned NOT NULL,
	`position` int NOT NULL,
	`threads` int NOT NULL,
	`current_a` double NOT NULL,
	`clock_mhz` double NOT NULL,
	CONSTRAINT `sweep_point_pass_id_position_pk` PRIMARY KEY(`pass_id`,`position`),
	CONSTRAINT `sweep_point_figures` CHECK(`sweep_point`.`threads` > 0 and `sweep_point`.`current_a` >= 0 and `sweep_point`.`clock_mhz` > 0)
);
--> statement-breakpoint
CREATE TABLE `firmware_meaning` (
	`id` int AUTO_INCREMENT NOT NULL,
	`family` varchar(80) NOT NULL,
	`setting` varchar(160) NOT NULL,
	`quantity` enum('reference-clock','core-ratio','core-clock','core-voltage','soc-voltage','automatic-boost','memory-data-rate','memory-voltage','memory-io-voltage','cas-latency','row-to-column-delay','row-precharge','row-active','row-cycle','refresh-cycle','command-rate','fabric-clock','memory-controller-clock','power-limit','current-limit','temperature-limit','load-line','switch-current','other') NOT NULL,
	`core_group` int NOT NULL DEFAULT 0,
	`created_by` varchar(36) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `firmware_meaning_id` PRIMARY KEY(`id`),
	CONSTRAINT `firmware_meaning_setting` UNIQUE(`family`,`setting`),
	CONSTRAINT `firmware_meaning_group` CHECK(`firmware_meaning`.`core_group` between 0 and 64)
);
--> statement-breakpoint
CREATE TABLE `lab_limit` (
	`id` int AUTO_INCREMENT NOT NULL,
	`quantity` enum('reference-clock','core-ratio','core-clock','core-voltage','soc-voltage','automatic-boost','memory-data-rate','memory-voltage','memory-io-voltage','cas-latency','row-to-column-delay','row-precharge','row-active','row-cycle','refresh-cycle','command-rate','fabric-clock','memory-controller-clock','power-limit','current-limit','temperature-limit','load-line','switch-current','other') NOT NULL,
	`part_kind` enum('processor','board','memory','cooler','graphics','storage','power-supply','case','other') NOT NULL,
	`limit` double NOT NULL,
	`unit` varchar(20) NOT NULL,
	`source` varchar(300) NOT NULL,
	`created_by` varchar(36) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `lab_limit_id` PRIMARY KEY(`id`),
	CONSTRAINT `lab_limit_what` UNIQUE(`quantity`,`part_kind`)
);
--> statement-breakpoint
CREATE TABLE `suite` (
	`id` int AUTO_INCREMENT NOT NULL,
	`slug` varchar(80) NOT NULL,
	`name` varchar(160) NOT NULL,
	`purpose` text NOT NULL,
	`created_by` varchar(36) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`archived_at` datetime(3),
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `suite_id` PRIMARY KEY(`id`),
	CONSTRAINT `suite_slug` UNIQUE(`slug`)
);
--> statement-breakpoint
CREATE TABLE `suite_workload` (
	`suite_id` int NOT NULL,
	`workload_id` int NOT NULL,
	`position` int NOT NULL,
	`repeats` int NOT NULL,
	CONSTRAINT `suite_workload_suite_id_workload_id_pk` PRIMARY KEY(`suite_id`,`workload_id`),
	CONSTRAINT `suite_workload_repeats` CHECK(`suite_workload`.`repeats` between 1 and 1000)
);
--> statement-breakpoint
ALTER TABLE `profile_setting` MODIFY COLUMN `quantity` enum('reference-clock','core-ratio','core-clock','core-voltage','soc-voltage','automatic-boost','memory-data-rate','memory-voltage','memory-io-voltage','cas-latency','row-to-column-delay','row-precharge','row-active','row-cycle','refresh-cycle','command-rate','fabric-clock','memory-controller-clock','power-limit','current-limit','temperature-limit','load-line','switch-current','other') NOT NULL DEFAULT 'other';--> statement-breakpoint
ALTER TABLE `campaign_workload` ADD `instrument_id` int;--> statement-breakpoint
ALTER TABLE `rig` ADD `firmware_family` varchar(80) DEFAULT '' NOT NULL;--> statement-breakpoint
ALTER TABLE `attempt` ADD CONSTRAINT `attempt_tester_id_user_id_fk` FOREIGN KEY (`tester_id`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `attempt` ADD CONSTRAINT `attempt_voided_by_user_id_fk` FOREIGN KEY (`voided_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `attempt` ADD CONSTRAINT `attempt_stress` FOREIGN KEY (`ladder_id`,`workload_id`) REFERENCES `ladder_stress`(`ladder_id`,`workload_id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `ladder` ADD CONSTRAINT `ladder_rig_revision_id_rig_revision_id_fk` FOREIGN KEY (`rig_revision_id`) REFERENCES `rig_revision`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `ladder` ADD CONSTRAINT `ladder_profile_id_profile_id_fk` FOREIGN KEY (`profile_id`) REFERENCES `profile`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `ladder` ADD CONSTRAINT `ladder_created_by_user_id_fk` FOREIGN KEY (`created_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `ladder_stress` ADD CONSTRAINT `ladder_stress_ladder_id_ladder_id_fk` FOREIGN KEY (`ladder_id`) REFERENCES `ladder`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `ladder_stress` ADD CONSTRAINT `ladder_stress_workload_id_workload_id_fk` FOREIGN KEY (`workload_id`) REFERENCES `workload`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sweep` ADD CONSTRAINT `sweep_rig_revision_id_rig_revision_id_fk` FOREIGN KEY (`rig_revision_id`) REFERENCES `rig_revision`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sweep` ADD CONSTRAINT `sweep_profile_id_profile_id_fk` FOREIGN KEY (`profile_id`) REFERENCES `profile`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sweep` ADD CONSTRAINT `sweep_workload_id_workload_id_fk` FOREIGN KEY (`workload_id`) REFERENCES `workload`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sweep` ADD CONSTRAINT `sweep_created_by_user_id_fk` FOREIGN KEY (`created_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sweep_pass` ADD CONSTRAINT `sweep_pass_sweep_id_sweep_id_fk` FOREIGN KEY (`sweep_id`) REFERENCES `sweep`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sweep_pass` ADD CONSTRAINT `sweep_pass_tester_id_user_id_fk` FOREIGN KEY (`tester_id`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sweep_pass` ADD CONSTRAINT `sweep_pass_voided_by_user_id_fk` FOREIGN KEY (`voided_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sweep_point` ADD CONSTRAINT `sweep_point_pass_id_sweep_pass_id_fk` FOREIGN KEY (`pass_id`) REFERENCES `sweep_pass`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `firmware_meaning` ADD CONSTRAINT `firmware_meaning_created_by_user_id_fk` FOREIGN KEY (`created_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `lab_limit` ADD CONSTRAINT `lab_limit_created_by_user_id_fk` FOREIGN KEY (`created_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `suite` ADD CONSTRAINT `suite_created_by_user_id_fk` FOREIGN KEY (`created_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `suite_workload` ADD CONSTRAINT `suite_workload_suite_id_suite_id_fk` FOREIGN KEY (`suite_id`) REFERENCES `suite`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `suite_workload` ADD CONSTRAINT `suite_workload_workload_id_workload_id_fk` FOREIGN KEY (`workload_id`) REFERENCES `workload`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `instrument_list` ON `instrument` (`retired_at`,`name`);--> statement-breakpoint
CREATE INDEX `attempt_ladder` ON `attempt` (`ladder_id`,`started_at`);--> statement-breakpoint
CREATE INDEX `ladder_list` ON `ladder` (`archived_at`,`created_at`);--> statement-breakpoint
CREATE INDEX `sweep_list` ON `sweep` (`archived_at`,`created_at`);--> statement-breakpoint
CREATE INDEX `suite_list` ON `suite` (`archived_at`,`name`);--> statement-breakpoint
CREATE INDEX `suite_workload_workload` ON `suite_workload` (`workload_id`);--> statement-breakpoint
ALTER TABLE `campaign_workload` ADD CONSTRAINT `campaign_workload_instrument_id_instrument_id_fk` FOREIGN KEY (`instrument_id`) REFERENCES `instrument`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `reading_counted` ON `reading` (`run_id`,`excluded_at`);