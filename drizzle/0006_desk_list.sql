CREATE TABLE `article_hand_over` (
	`id` int AUTO_INCREMENT NOT NULL,
	`article_id` int NOT NULL,
	`from_id` varchar(36) NOT NULL,
	`to_id` varchar(36) NOT NULL,
	`made_by` varchar(36) NOT NULL,
	`made_at` datetime(3) NOT NULL,
	CONSTRAINT `article_hand_over_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `article_tag` (
	`article_id` int NOT NULL,
	`tag` varchar(40) NOT NULL,
	CONSTRAINT `article_tag_article_id_tag_pk` PRIMARY KEY(`article_id`,`tag`)
);
--> statement-breakpoint
CREATE TABLE `article_text` (
	`article_id` int NOT NULL,
	`title` varchar(200) NOT NULL,
	`standfirst` varchar(500) NOT NULL,
	`source` mediumtext NOT NULL,
	CONSTRAINT `article_text_article_id` PRIMARY KEY(`article_id`)
);
--> statement-breakpoint
CREATE TABLE `desk_view` (
	`id` int AUTO_INCREMENT NOT NULL,
	`owner_id` varchar(36) NOT NULL,
	`name` varchar(60) NOT NULL,
	`query` varchar(1000) NOT NULL,
	`shared` boolean NOT NULL DEFAULT false,
	`created_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `desk_view_id` PRIMARY KEY(`id`),
	CONSTRAINT `desk_view_name` UNIQUE(`owner_id`,`name`)
);
--> statement-breakpoint
ALTER TABLE `article_hand_over` ADD CONSTRAINT `article_hand_over_article_id_article_id_fk` FOREIGN KEY (`article_id`) REFERENCES `article`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `article_hand_over` ADD CONSTRAINT `article_hand_over_from_id_user_id_fk` FOREIGN KEY (`from_id`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `article_hand_over` ADD CONSTRAINT `article_hand_over_to_id_user_id_fk` FOREIGN KEY (`to_id`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `article_hand_over` ADD CONSTRAINT `article_hand_over_made_by_user_id_fk` FOREIGN KEY (`made_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `article_tag` ADD CONSTRAINT `article_tag_article_id_article_id_fk` FOREIGN KEY (`article_id`) REFERENCES `article`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `article_text` ADD CONSTRAINT `article_text_article_id_article_id_fk` FOREIGN KEY (`article_id`) REFERENCES `article`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `desk_view` ADD CONSTRAINT `desk_view_owner_id_user_id_fk` FOREIGN KEY (`owner_id`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `article_hand_over_from` ON `article_hand_over` (`article_id`,`from_id`);--> statement-breakpoint
CREATE INDEX `article_tag_tag` ON `article_tag` (`tag`);--> statement-breakpoint
CREATE INDEX `desk_view_shared` ON `desk_view` (`shared`);--> statement-breakpoint
CREATE INDEX `article_updated` ON `article` (`updated_at`);