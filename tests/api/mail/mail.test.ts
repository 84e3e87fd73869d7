import { eq } from 'drizzle-orm';
import { simpleParser } from 'mailparser';
import { SMTPServer } from 'smtp-server';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { withScope } from '@/db/scope';
import { mails } from '@/db/schema/activity';
import type { MailId, WorkspaceId } from '@/lib/contracts/ids';
import { insertMail } from '@/db/queries/mails';
import { sendMail } from '@/lib/use-cases/jobs/send-mail';
import { makeWorkspace } from '../setup/fixture';

const received: Awaited<ReturnType<typeof simpleParser>>[] = [];
let refuses = false;
const server = new SMTPServer({
  authOptional: true,
  disabledCommands: ['STARTTLS'],
  onData(stream, _session, done) {
    void simpleParser(stream).then((mail) => {
      if (refuses) return done(new Error('The mailbox is full.'));
      received.push(mail);
      done();
    });
  },
});

beforeAll(async () => {
  const port = await new Promise<number>((resolve) => {
    const listening = server.listen(0, '127.0.0.1', () => resolve(listening.address().port));
  });
  // The configuration is read at first use, which is after this.
  process.env.SMTP_URL = `smtp://127.0.0.1:${port}`;
});
afterAll(() => new Promise<void>((resolve) => server.close(resolve)));

const link = 'http://127.0.0.1:3000/house/season/pairings/1?decide=1';

function queue(workspaceId: WorkspaceId): Promise<MailId> {
  return withScope({ workspaceId }, (tx) =>
    insertMail(tx, {
      workspaceId,
      template: 'pairing-proposed',
      recipient: 'partner@example.test',
      subject: 'A pairing is proposed',
      data: {
        name: 'Partner',
        proposer: 'Owner',
        project: 'First project',
        title: 'Albino × Normal',
        answerBy: '2027-01-10',
        shareLine: '',
        link,
      },
    }),
  );
}

async function read(workspaceId: WorkspaceId, id: MailId) {
  const [row] = await withScope({ workspaceId }, (tx) => tx.select().from(mails).where(eq(mails.id, id)));
  return row;
}

test('a mail goes out once, as HTML and text with its link, however often the job runs', async () => {
  const { id: workspaceId } = await makeWorkspace();
  const mailId = await queue(workspaceId);
  await sendMail({ mailId, workspaceId });
  await sendMail({ mailId, workspaceId });
  expect(received).toHaveLength(1);
  expect(received[0]).toMatchObject({ subject: 'A pairing is proposed', messageId: `<${mailId}@moiety>` });
  expect(received[0]?.text).toContain(link);
  expect(received[0]?.html).toContain('Albino × Normal');
  expect(await read(workspaceId, mailId)).toMatchObject({ status: 'sent', attempts: 1, lastError: null });
});

test('what the mail server refused is kept and tried again', async () => {
  const { id: workspaceId } = await makeWorkspace();
  const mailId = await queue(workspaceId);
  refuses = true;
  await expect(sendMail({ mailId, workspaceId })).rejects.toThrow(/mailbox is full/);
  expect(await read(workspaceId, mailId)).toMatchObject({
    status: 'queued',
    attempts: 1,
    lastError: expect.stringContaining('mailbox is full'),
  });
  refuses = false;
  await sendMail({ mailId, workspaceId });
  expect(await read(workspaceId, mailId)).toMatchObject({ status: 'sent', attempts: 2, lastError: null });
});

test('a job under another workspace finds nothing to send', async () => {
  const [here, there] = [await makeWorkspace(), await makeWorkspace()];
  const mailId = await queue(here.id);
  const before = received.length;
  await sendMail({ mailId, workspaceId: there.id });
  expect(received).toHaveLength(before);
  expect(await read(here.id, mailId)).toMatchObject({ status: 'queued', attempts: 0 });
});
