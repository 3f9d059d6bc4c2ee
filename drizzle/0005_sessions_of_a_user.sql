DROP INDEX "audit_object";--> statement-breakpoint
CREATE INDEX "session_user" ON "session" USING btree (("sess" ->> 'userId'));--> statement-breakpoint
CREATE INDEX "audit_object" ON "audit" USING btree ("object_id","id");