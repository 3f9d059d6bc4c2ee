CREATE TABLE "catalogue_version" (
	"one" boolean PRIMARY KEY DEFAULT true NOT NULL,
	"version" text NOT NULL,
	CONSTRAINT "catalogue_version_one" CHECK ("catalogue_version"."one")
);
