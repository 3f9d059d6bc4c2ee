DROP INDEX "listings_live_title";--> statement-breakpoint
CREATE INDEX "listings_live_near" ON "listings" USING gin ((title || ' ' || words) gin_trgm_ops) WHERE status = 'live';