ALTER TABLE `crags` MODIFY `pos` POINT REF_SYSTEM_ID=4326 NOT NULL;
--> statement-breakpoint
ALTER TABLE `climbs` MODIFY `foot` POINT REF_SYSTEM_ID=4326 NOT NULL;
--> statement-breakpoint
ALTER TABLE `anchor_points` MODIFY `pos` POINT REF_SYSTEM_ID=4326 NOT NULL;
--> statement-breakpoint
CREATE SPATIAL INDEX `crags_pos` ON `crags` (`pos`);
--> statement-breakpoint
CREATE SPATIAL INDEX `climbs_foot` ON `climbs` (`foot`);
--> statement-breakpoint
CREATE SPATIAL INDEX `anchor_points_pos` ON `anchor_points` (`pos`);
