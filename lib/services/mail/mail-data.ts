/** What each mail needs to be written; the templates stand beside this file. Links are whole addresses. */
export interface MailData {
  'verify-address': { name: string; link: string };
  'reset-password': { name: string; link: string };
  'sign-in-link': { link: string };
  invitation: {
    inviter: string;
    workspace: string;
    role: string;
    projects: string[];
    link: string;
    expires: string;
  };
  'pairing-proposed': {
    name: string;
    proposer: string;
    project: string;
    title: string;
    answerBy: string | null;
    shareLine: string;
    link: string;
  };
  'pairing-decided': {
    name: string;
    decider: string;
    decision: 'agreed' | 'change_asked';
    comment: string;
    project: string;
    title: string;
    state: string;
    link: string;
  };
  'terms-proposed': {
    name: string;
    proposer: string;
    project: string;
    number: number;
    changes: string[];
    link: string;
  };
  'terms-decided': {
    name: string;
    decider: string;
    decision: 'agreed' | 'change_asked';
    comment: string;
    project: string;
    number: number;
    state: string;
    link: string;
  };
  invoice: {
    name: string;
    seller: string;
    number: string;
    total: string;
    due: string;
    lines: { text: string; amount: string }[];
    link: string;
  };
  receipt: {
    name: string;
    seller: string;
    number: string;
    amount: string;
    method: string;
    left: string;
    link: string;
  };
  refund: { name: string; seller: string; number: string; amount: string; reason: string; link: string };
  'settlement-proposed': { name: string; proposer: string; period: string; line: string; link: string };
  'settlement-decided': {
    name: string;
    decider: string;
    decision: 'agreed' | 'change_asked';
    comment: string;
    period: string;
    link: string;
  };
  'contact-mail': { subject: string; text: string; seller: string };
  reminder: { name: string; text: string; link: string };
}
export type MailTemplate = keyof MailData;

const subjects: { [Template in MailTemplate]: (data: MailData[Template]) => string } = {
  'verify-address': () => 'Confirm your address for Moiety',
  'reset-password': () => 'Set a new password',
  'sign-in-link': () => 'Your link to sign in',
  invitation: ({ workspace }) => `${workspace} invites you to Moiety`,
  'pairing-proposed': ({ title, project }) => `${project}: pairing proposed, ${title}`,
  'pairing-decided': ({ decider, decision, title }) =>
    `${decider} ${decision === 'agreed' ? 'agreed to' : 'asked to change'} ${title}`,
  'terms-proposed': ({ project, number }) => `${project}: terms version ${number} proposed`,
  'terms-decided': ({ decider, decision, number, project }) =>
    `${decider} ${decision === 'agreed' ? 'agreed to' : 'asked to change'} terms version ${number} of ${project}`,
  invoice: ({ seller, number }) => `Invoice ${number} from ${seller}`,
  receipt: ({ seller, number }) => `Receipt for invoice ${number} from ${seller}`,
  refund: ({ seller, number }) => `Refund for invoice ${number} from ${seller}`,
  'settlement-proposed': ({ period }) => `Settlement ${period} waits for you`,
  'settlement-decided': ({ decider, decision, period }) =>
    `${decider} ${decision === 'agreed' ? 'agreed to' : 'asked to change'} settlement ${period}`,
  'contact-mail': ({ subject }) => subject,
  reminder: ({ text }) => text,
};

/** The subject line of a mail, without line breaks. */
export function subjectOf<Template extends MailTemplate>(
  template: Template,
  data: MailData[Template],
): string {
  return subjects[template](data).replace(/[\r\n]+/g, ' ');
}
