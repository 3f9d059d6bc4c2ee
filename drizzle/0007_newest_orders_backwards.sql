DROP INDEX "orders_builder";--> statement-breakpoint
DROP INDEX "orders_seller";--> statement-breakpoint
DROP INDEX "orders_newest";--> statement-breakpoint
CREATE INDEX "orders_builder" ON "orders" USING btree ("builder_id","created_at","id");--> statement-breakpoint
CREATE INDEX "orders_seller" ON "orders" USING btree ("seller_id","created_at","id");--> statement-breakpoint
CREATE INDEX "orders_newest" ON "orders" USING btree ("created_at","id");