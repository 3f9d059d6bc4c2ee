// Where drizzle-kit finds the tables (one file per feature) and puts the generated SQL migrations.
import { defineConfig } from 'drizzle-kit';

export default defineConfig({
  dialect: 'postgresql',
  schema: './server/*/tables.ts',
  out: './drizzle',
});
