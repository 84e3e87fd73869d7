// Passwords and keys of the services on this machine: random, made once, readable by their owner only.

import crypto from 'node:crypto';
import { ensureMoiety, inMoiety, readJson, writeJson } from './places.mjs';

/**
 * @typedef {object} LocalSecrets
 * @property {string} databaseSuperuser
 * @property {string} databaseOwner
 * @property {string} databaseApp
 * @property {string} authSecret signs sessions
 * @property {string} stripeWebhookSecret shared with the local card-payment server
 */

/** @returns {LocalSecrets} */
export function localSecrets() {
  const file = inMoiety('secrets.json');
  const kept = readJson(file, /** @type {Partial<LocalSecrets>} */ ({}));
  // URL-safe, so that they stand in a connection string as they are.
  const random = () => crypto.randomBytes(24).toString('base64url');
  const secrets = {
    databaseSuperuser: kept.databaseSuperuser ?? random(),
    databaseOwner: kept.databaseOwner ?? random(),
    databaseApp: kept.databaseApp ?? random(),
    authSecret: kept.authSecret ?? crypto.randomBytes(32).toString('base64url'),
    stripeWebhookSecret: kept.stripeWebhookSecret ?? `whsec_${random()}`,
  };
  if (
    Object.entries(secrets).some(([name, value]) => kept[/** @type {keyof LocalSecrets} */ (name)] !== value)
  ) {
    ensureMoiety();
    writeJson(file, secrets, 0o600);
  }
  return secrets;
}
