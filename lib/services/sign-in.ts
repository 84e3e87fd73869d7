import 'server-only';
import { betterAuth } from 'better-auth';
import { drizzleAdapter } from 'better-auth/adapters/drizzle';
import { nextCookies } from 'better-auth/next-js';
import { magicLink, twoFactor } from 'better-auth/plugins';
import { connectDatabase } from '@/db/connection';
import { credentials, rateLimits, sessions, twoFactors, users, verifications } from '@/db/schema/auth';
import type { UserId } from '@/lib/contracts/ids';
import type { MailData, MailTemplate } from './mail/mail-data';
import { configuration } from './configuration';

/** Sends a mail of the sign-in; given by the module that starts the server, because it needs the mail queue. */
type SendMail = <Template extends MailTemplate>(
  template: Template,
  to: string,
  data: MailData[Template],
) => Promise<void>;

const kept = globalThis as { moietySignIn?: ReturnType<typeof build>; moietySignInMail?: SendMail };

/** Tells the sign-in how to send its mails. */
export function setSignInMail(send: SendMail): void {
  kept.moietySignInMail = send;
}

const sendMail: SendMail = async (template, to, data) => {
  if (!kept.moietySignInMail) throw new Error('The sign-in has no mail queue: call setSignInMail first.');
  await kept.moietySignInMail(template, to, data);
};

function build() {
  const { appUrl, auth } = configuration();
  return betterAuth({
    appName: 'Moiety',
    baseURL: appUrl,
    secret: auth.secret,
    trustedOrigins: [appUrl],
    telemetry: { enabled: false },
    database: drizzleAdapter(connectDatabase(), {
      provider: 'pg',
      schema: {
        user: users,
        session: sessions,
        account: credentials,
        verification: verifications,
        twoFactor: twoFactors,
        rateLimit: rateLimits,
      },
    }),
    rateLimit: { enabled: auth.hasRateLimit, storage: 'database', window: 60, max: 60 },
    session: { expiresIn: 60 * 60 * 24 * 30, updateAge: 60 * 60 * 24 },
    advanced: { cookiePrefix: 'moiety' },
    emailAndPassword: {
      enabled: true,
      requireEmailVerification: true,
      minPasswordLength: 10,
      maxPasswordLength: 128,
      revokeSessionsOnPasswordReset: true,
      sendResetPassword: ({ user, url }) =>
        sendMail('reset-password', user.email, { name: user.name, link: url }),
    },
    emailVerification: {
      sendOnSignUp: true,
      sendOnSignIn: true,
      autoSignInAfterVerification: true,
      sendVerificationEmail: ({ user, url }) =>
        sendMail('verify-address', user.email, { name: user.name, link: url }),
    },
    plugins: [
      magicLink({
        expiresIn: 15 * 60,
        // Buyers get an account by following their link; the link itself proves the address.
        sendMagicLink: ({ email, url }) => sendMail('sign-in-link', email, { link: url }),
      }),
      twoFactor({ issuer: 'Moiety' }),
      nextCookies(),
    ],
  });
}

/** The sign-in library, set up at first use (importing must not need a configuration). */
export function signIn() {
  kept.moietySignIn ??= build();
  return kept.moietySignIn;
}

export interface SignedIn {
  userId: UserId;
  name: string;
  email: string;
}

/** Who sends these headers: a signed-in person with a verified address, or nobody. */
export async function findPerson(headers: Headers): Promise<SignedIn | null> {
  const session = await signIn().api.getSession({ headers });
  if (!session || !session.user.emailVerified) return null;
  return { userId: session.user.id as UserId, name: session.user.name, email: session.user.email };
}
