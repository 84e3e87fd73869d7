import { mkdirSync, rmSync } from 'node:fs';
import { inject } from 'vitest';
import { databaseUrls } from '../../../scripts/setup/databases.mjs';
import { inMoiety } from '../../../scripts/setup/places.mjs';
import { cloneTemplate, refuseRemote } from '../../../scripts/setup/template.mjs';

// Each test file gets a database of its own, cloned from the template, before any module of the product is loaded.

const { port, bin, template, prefix } = inject('testDatabase');
const name = `${prefix}_w${process.env.VITEST_POOL_ID ?? '0'}`;
const urls = databaseUrls(port, name);
refuseRemote(urls.superuser);
await cloneTemplate({ port, bin }, template, name);

const storage = inMoiety('test-storage', name);
rmSync(storage, { recursive: true, force: true });
mkdirSync(storage, { recursive: true });

Object.assign(process.env, {
  DATABASE_URL: urls.app,
  DATABASE_OWNER_URL: urls.owner,
  DATABASE_POOL_SIZE: '5',
  APP_URL: 'http://127.0.0.1:3000',
  AUTH_SECRET: 'only-for-the-tests-of-the-api-0123456789',
  AUTH_RATE_LIMIT: '0',
  DEMO: '0',
  JOBS: '0',
  LOG_LEVEL: process.env.LOG_LEVEL ?? 'error',
  // Nothing listens on port 9: a test that sends mail or takes payments starts a server of its own and says where.
  SMTP_URL: 'smtp://127.0.0.1:9',
  MAIL_FROM: 'Moiety <no-reply@moiety.example>',
  STRIPE_SECRET_KEY: 'sk_test_local',
  STRIPE_WEBHOOK_SECRET: 'whsec_only_for_the_tests_of_the_api',
  STRIPE_API_BASE: 'http://127.0.0.1:9',
  STORAGE_URL: `file:${storage}`,
});
