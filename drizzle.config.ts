import { defineConfig } from 'drizzle-kit'

/** `npx drizzle-kit generate --name=what_it_does` writes the next migration from db/schema. */
export default defineConfig({
  dialect: 'postgresql',
  schema: './db/schema/*.ts',
  out: './db/migrations',
})
