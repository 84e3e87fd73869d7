import type { MailData, MailTemplate } from './mail-data';

/** What a mail says, before it is laid out: one heading, paragraphs, perhaps rows of figures, at most one thing to do. */
export interface MailContent {
  heading: string;
  paragraphs: string[];
  rows?: { text: string; amount: string }[];
  button?: { label: string; link: string };
}

const decided = (decision: 'agreed' | 'change_asked') =>
  decision === 'agreed' ? 'agreed' : 'asked for a change';
const said = (comment: string) => (comment ? [`“${comment}”`] : []);

const contents: { [Template in MailTemplate]: (data: MailData[Template]) => MailContent } = {
  'verify-address': ({ name, link }) => ({
    heading: `Welcome, ${name}`,
    paragraphs: [
      'Confirm that this address is yours; then you can sign in.',
      'If you did not ask for this, nothing has to be done.',
    ],
    button: { label: 'Confirm the address', link },
  }),
  'reset-password': ({ name, link }) => ({
    heading: `A new password, ${name}`,
    paragraphs: [
      'With this link you set a new password. It works once, for an hour.',
      'If you did not ask for this, your password stays as it is.',
    ],
    button: { label: 'Set a new password', link },
  }),
  'sign-in-link': ({ link }) => ({
    heading: 'Your link to sign in',
    paragraphs: ['It works once, for 15 minutes.', 'If you did not ask for this, nothing has to be done.'],
    button: { label: 'Sign in', link },
  }),
  invitation: ({ inviter, workspace, role, projects, link, expires }) => ({
    heading: `${workspace} invites you`,
    paragraphs: [
      `${inviter} invites you as ${role}.${projects.length > 0 ? ` Joint projects: ${projects.join(', ')}.` : ''}`,
      `The invitation holds until ${expires}.`,
    ],
    button: { label: 'Look at the invitation', link },
  }),
  'pairing-proposed': ({ name, proposer, project, title, answerBy, shareLine, link }) => ({
    heading: title,
    paragraphs: [
      `${name}, ${proposer} proposes this pairing for ${project}.`,
      ...(shareLine ? [shareLine] : []),
      ...(answerBy ? [`Please answer by ${answerBy}.`] : []),
    ],
    button: { label: 'See it and decide', link },
  }),
  'pairing-decided': ({ name, decider, decision, comment, project, title, state, link }) => ({
    heading: title,
    paragraphs: [`${name}, ${decider} ${decided(decision)} (${project}).`, ...said(comment), state],
    button: { label: 'Open the pairing', link },
  }),
  'terms-proposed': ({ name, proposer, project, number, changes, link }) => ({
    heading: `${project}: terms version ${number}`,
    paragraphs: [`${name}, ${proposer} proposes version ${number} of the terms.`, ...changes],
    button: { label: 'Read and decide', link },
  }),
  'terms-decided': ({ name, decider, decision, comment, project, number, state, link }) => ({
    heading: `${project}: terms version ${number}`,
    paragraphs: [`${name}, ${decider} ${decided(decision)}.`, ...said(comment), state],
    button: { label: 'Open the terms', link },
  }),
  invoice: ({ name, seller, number, total, due, lines, link }) => ({
    heading: `Invoice ${number}`,
    paragraphs: [`${name}, this is your invoice from ${seller} over ${total}.`, due],
    rows: lines,
    button: { label: 'See and pay the invoice', link },
  }),
  receipt: ({ name, seller, number, amount, method, left, link }) => ({
    heading: `Thank you, ${name}`,
    paragraphs: [`${seller} received ${amount} (${method}) for invoice ${number}.`, left],
    button: { label: 'See the invoice', link },
  }),
  refund: ({ name, seller, number, amount, reason, link }) => ({
    heading: `Refund of ${amount}`,
    paragraphs: [`${name}, ${seller} gives back ${amount} of invoice ${number}.`, reason],
    button: { label: 'See the invoice', link },
  }),
  'settlement-proposed': ({ name, proposer, period, line, link }) => ({
    heading: `Settlement ${period}`,
    paragraphs: [`${name}, ${proposer} proposes the settlement.`, line],
    button: { label: 'See it and decide', link },
  }),
  'settlement-decided': ({ name, decider, decision, comment, period, link }) => ({
    heading: `Settlement ${period}`,
    paragraphs: [`${name}, ${decider} ${decided(decision)}.`, ...said(comment)],
    button: { label: 'Open the settlement', link },
  }),
  'contact-mail': ({ subject, text, seller }) => ({
    heading: subject,
    paragraphs: [...text.split(/\n{2,}/), seller],
  }),
  reminder: ({ name, text, link }) => ({
    heading: text,
    paragraphs: [`${name}, this is due.`],
    button: { label: 'Open it', link },
  }),
};

/** Writes a mail. */
export function contentOf<Template extends MailTemplate>(
  template: Template,
  data: MailData[Template],
): MailContent {
  return contents[template](data);
}
