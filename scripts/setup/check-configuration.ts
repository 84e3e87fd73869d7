// Checks the environment as the app will read it, and says everything that is wrong at once.

import { ConfigurationError, readConfiguration } from '@/lib/services/configuration';

try {
  readConfiguration(process.env);
} catch (error) {
  if (!(error instanceof ConfigurationError)) throw error;
  console.error(error.message);
  process.exit(1);
}
