// As much of these two packages' shapes as the test needs; they bring no types of their own.
declare module 'smtp-server' {
  import type { Readable } from 'node:stream';
  export class SMTPServer {
    constructor(options: {
      authOptional?: boolean;
      disabledCommands?: string[];
      logger?: boolean;
      onData(stream: Readable, session: object, done: (error?: Error | null) => void): void;
    });
    listen(port: number, host: string, ready: () => void): { address(): { port: number } };
    close(done: () => void): void;
  }
}
declare module 'mailparser' {
  import type { Readable } from 'node:stream';
  export function simpleParser(
    source: Readable,
  ): Promise<{ subject?: string; text?: string; html?: string | false; messageId?: string }>;
}
