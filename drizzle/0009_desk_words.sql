CREATE TABLE `article_check` (
	`article_id` int NOT NULL,
	`group` enum('data','prose','pictures','law') NOT NULL,
	`item` varchar(200) NOT NULL,
	`checked_by` varchar(36) NOT NULL,
	`checked_at` datetime(3) NOT NULL,
	CONSTRAINT `article_check_article_id_group_item_pk` PRIMARY KEY(`article_id`,`group`,`item`)
);
--> statement-breakpoint
CREATE TABLE `article_template` (
	`id` int AUTO_INCREMENT NOT NULL,
	`slug` varchar(80) NOT NULL,
	`head` int NOT NULL,
	`retired_at` datetime(3),
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `article_template_id` PRIMARY KEY(`id`),
	CONSTRAINT `article_template_kind` UNIQUE(`slug`)
);
--> statement-breakpoint
CREATE TABLE `glossary_term` (
	`id` int AUTO_INCREMENT NOT NULL,
	`slug` varchar(80) NOT NULL,
	`term` varchar(120) NOT NULL,
	`explanation` text NOT NULL,
	`aliases` json NOT NULL,
	`created_by` varchar(36) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`updated_by` varchar(36) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	`retired_at` datetime(3),
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `glossary_term_id` PRIMARY KEY(`id`),
	CONSTRAINT `glossary_term_slug` UNIQUE(`slug`),
	CONSTRAINT `glossary_term_term` UNIQUE(`term`)
);
--> statement-breakpoint
CREATE TABLE `template_revision` (
	`id` int AUTO_INCREMENT NOT NULL,
	`template_id` int NOT NULL,
	`number` int NOT NULL,
	`name` varchar(80) NOT NULL,
	`title` varchar(200) NOT NULL,
	`standfirst` varchar(500) NOT NULL,
	`purpose` varchar(300) NOT NULL,
	`body` mediumtext NOT NULL,
	`checklist` json NOT NULL,
	`saved_by` varchar(36) NOT NULL,
	`saved_at` datetime(3) NOT NULL,
	`note` varchar(200) NOT NULL DEFAULT '',
	CONSTRAINT `template_revision_id` PRIMARY KEY(`id`),
	CONSTRAINT `template_revision_number` UNIQUE(`template_id`,`number`)
);
--> statement-breakpoint
ALTER TABLE `article_check` ADD CONSTRAINT `article_check_article_id_article_id_fk` FOREIGN KEY (`article_id`) REFERENCES `article`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `article_check` ADD CONSTRAINT `article_check_checked_by_user_id_fk` FOREIGN KEY (`checked_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `glossary_term` ADD CONSTRAINT `glossary_term_created_by_user_id_fk` FOREIGN KEY (`created_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `glossary_term` ADD CONSTRAINT `glossary_term_updated_by_user_id_fk` FOREIGN KEY (`updated_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `template_revision` ADD CONSTRAINT `template_revision_template_id_article_template_id_fk` FOREIGN KEY (`template_id`) REFERENCES `article_template`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `template_revision` ADD CONSTRAINT `template_revision_saved_by_user_id_fk` FOREIGN KEY (`saved_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `glossary_term_list` ON `glossary_term` (`retired_at`,`term`);