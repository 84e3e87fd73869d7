import 'server-only';
import { createTransport } from 'nodemailer';
import { configuration } from '../configuration';

/**
 * Hands a mail to the mail server.
 * @returns the message id
 * @throws what the server or the connection said
 */
export async function deliverMail(mail: {
  to: string;
  subject: string;
  html: string;
  text: string;
  id: string;
}): Promise<string> {
  const { smtpUrl, from } = configuration().mail;
  const transport = createTransport(smtpUrl);
  try {
    const { id, ...message } = mail;
    // The same row always has the same message id, so that a mail system can drop a copy that was sent twice.
    const sent = await transport.sendMail({ from, ...message, messageId: `<${id}@moiety>` });
    return sent.messageId;
  } finally {
    transport.close();
  }
}
