// Stands for `server-only` in tests, which run server modules outside of the framework's bundler.
export {};
