import 'server-only';
import {
  Body,
  Button,
  Container,
  Head,
  Heading,
  Hr,
  Html,
  render,
  Section,
  Text,
} from '@react-email/components';
import type { MailContent } from './mail-content';

const ink = '#191C1F';
const text = { color: ink, fontSize: '15px', lineHeight: '22px', margin: '0 0 12px' };

/** The one layout of all mails: warm paper, dark ink, one hot colour for the one thing to do. */
function MailLayout({ heading, paragraphs, rows = [], button }: MailContent) {
  return (
    <Html lang="en">
      <Head />
      <Body
        style={{
          backgroundColor: '#F3EFE6',
          fontFamily: 'Helvetica, Arial, sans-serif',
          margin: 0,
          padding: '24px 0',
        }}
      >
        <Container
          style={{
            backgroundColor: '#FDFBF6',
            border: '1px solid #DDD6C7',
            maxWidth: '520px',
            padding: '28px 32px',
          }}
        >
          <Heading as="h1" style={{ color: ink, fontSize: '20px', lineHeight: '26px', margin: '0 0 16px' }}>
            {heading}
          </Heading>
          {paragraphs.map((paragraph, index) => (
            <Text key={index} style={{ ...text, whiteSpace: 'pre-line' }}>
              {paragraph}
            </Text>
          ))}
          {rows.map((row, index) => (
            <Text key={index} style={{ ...text, margin: '0 0 4px' }}>
              {row.text}: {row.amount}
            </Text>
          ))}
          {button ? (
            <Section style={{ margin: '20px 0 8px' }}>
              <Button
                href={button.link}
                style={{
                  backgroundColor: '#B8461F',
                  borderRadius: '8px',
                  color: '#FFFFFF',
                  fontSize: '15px',
                  fontWeight: 700,
                  padding: '12px 20px',
                }}
              >
                {button.label}
              </Button>
            </Section>
          ) : null}
          <Hr style={{ borderColor: '#DDD6C7', margin: '20px 0 12px' }} />
          <Text style={{ color: '#5F676C', fontSize: '13px', margin: 0 }}>Sent by Moiety.</Text>
        </Container>
      </Body>
    </Html>
  );
}

/** Lays a mail out as HTML and as plain text. */
export async function renderMail(content: MailContent): Promise<{ html: string; text: string }> {
  const mail = <MailLayout {...content} />;
  return { html: await render(mail), text: await render(mail, { plainText: true }) };
}
