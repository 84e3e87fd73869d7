import { defineConfig } from 'drizzle-kit';

export default defineConfig({
  dialect: 'postgresql',
  schema: './db/schema/*.ts',
  out: './drizzle',
  dbCredentials: { url: process.env.DATABASE_OWNER_URL ?? 'postgres://localhost/moiety' },
});
