import type Stripe from 'stripe';
import { ApiError } from '../api-error';
import { readCardEntry, testCards, type TestCard } from '../cards';
import { answerSessionChallenge, paySession, successAddress } from '../checkout-sessions';
import { answerChallenge } from '../payment-intents';
import type { Runtime } from '../runtime';
import {
  renderChallenge,
  renderCheckout,
  renderClosed,
  type CheckoutForm,
  type FieldName,
} from './checkout-page';
import { renderHome } from './home-page';
import { renderMessage } from './page';

export interface PageAnswer {
  status: number;
  body: string;
  location?: string;
}

const page = (body: string, status = 200): PageAnswer => ({ status, body });
// 303: the browser fetches the next page with GET, and a reload pays nothing twice.
const onward = (location: string): PageAnswer => ({ status: 303, body: '', location });

const outcomes: Readonly<Record<string, string>> = {
  accept: '4242424242424242',
  decline: '4000000000000002',
  challenge: '4000000000003220',
};

const looksLikeEmail = (text: string) => /^[^\s@]+@[^\s@]+\.[^\s@]+$/.test(text);

function showForm(
  runtime: Runtime,
  session: Stripe.Checkout.Session,
  given: Partial<CheckoutForm> = {},
): string {
  const payer = runtime.world.state.payers[session.id];
  const form = {
    name: payer?.name ?? '',
    email: payer?.email ?? session.customer_email ?? '',
    problem: null,
    ...given,
  };
  return renderCheckout(session, runtime.world.state.lineItems[session.id] ?? [], form);
}

/** The card that was typed, or that a button for an outcome stands for; or what is wrong with what was typed. */
function readCard(form: URLSearchParams, now: Date): TestCard | { text: string; field: FieldName } {
  const chosen = outcomes[form.get('outcome') ?? ''];
  const known = testCards.find((card) => card.number === chosen);
  if (known !== undefined) return known;
  if (!looksLikeEmail(form.get('email') ?? '')) return { text: 'Give your e-mail address.', field: 'email' };
  const entered = readCardEntry(
    {
      number: form.get('number') ?? '',
      expiry: form.get('expiry') ?? '',
      securityCode: form.get('securityCode') ?? '',
    },
    now,
  );
  if ('decline' in entered && 'field' in entered)
    return { text: entered.decline.message, field: entered.field };
  if ((form.get('name') ?? '').trim() === '') return { text: 'Give the name on the card.', field: 'name' };
  return entered;
}

/** Runs work that may be declined, and keeps what it changed either way. */
function attempt(runtime: Runtime, work: () => void): ApiError | null {
  try {
    work();
    return null;
  } catch (error) {
    if (error instanceof ApiError) return error;
    throw error;
  } finally {
    runtime.commit();
  }
}

function pay(runtime: Runtime, session: Stripe.Checkout.Session, form: URLSearchParams): PageAnswer {
  const name = (form.get('name') ?? '').trim();
  const email = (form.get('email') ?? '').trim();
  const card = readCard(form, new Date(runtime.world.nowMs()));
  if ('text' in card) return page(showForm(runtime, session, { name, email, problem: card }), 422);
  const payer = { email: email === '' ? session.customer_email : email, name: name === '' ? null : name };
  runtime.world.state.payers[session.id] = payer;
  let isChallenged = false;
  const failure = attempt(runtime, () => {
    isChallenged = paySession(runtime.world, session, card, payer);
  });
  if (failure !== null) {
    const problem = { text: failure.message, field: 'number' as const };
    return page(showForm(runtime, session, { name, email, problem }), 402);
  }
  return onward(isChallenged ? `/pay/${session.id}/challenge` : successAddress(session));
}

function answerBank(runtime: Runtime, session: Stripe.Checkout.Session, form: URLSearchParams): PageAnswer {
  const payer = runtime.world.state.payers[session.id] ?? { email: session.customer_email, name: null };
  const failure = attempt(runtime, () =>
    answerSessionChallenge(runtime.world, session, form.get('answer') === 'accept', payer),
  );
  if (failure === null) return onward(successAddress(session));
  return page(showForm(runtime, session, { problem: { text: failure.message, field: null } }), 402);
}

function answerSession(
  runtime: Runtime,
  id: string,
  isBank: boolean,
  form: URLSearchParams | null,
): PageAnswer {
  const session = runtime.world.state.sessions[id];
  if (session === undefined) return notFound();
  if (session.status !== 'open') return page(renderClosed(session), form === null ? 200 : 409);
  if (!isBank) return form === null ? page(showForm(runtime, session)) : pay(runtime, session, form);
  const intent = runtime.world.state.intents[String(session.payment_intent)];
  if (intent?.status !== 'requires_action') return onward(`/pay/${id}`);
  return form === null
    ? page(renderChallenge(intent.amount, intent.currency))
    : answerBank(runtime, session, form);
}

/** The bank's page for an intent that was confirmed through the API. */
function answerIntent(runtime: Runtime, id: string, form: URLSearchParams | null): PageAnswer {
  const intent = runtime.world.state.intents[id];
  if (intent === undefined) return notFound();
  if (intent.status !== 'requires_action') {
    return page(renderMessage('Nothing to confirm', 'This payment asks for nothing more.', null));
  }
  if (form === null) return page(renderChallenge(intent.amount, intent.currency));
  const returnUrl = intent.next_action?.redirect_to_url?.return_url ?? null;
  const payer = { email: intent.receipt_email, name: null };
  const isAccepted = form.get('answer') === 'accept';
  const failure = attempt(runtime, () => answerChallenge(runtime.world, intent, isAccepted, payer));
  if (returnUrl === null)
    return page(
      renderMessage(failure === null ? 'Confirmed' : 'Not confirmed', 'You can close this page.', null),
    );
  const address = new URL(returnUrl);
  address.searchParams.set('payment_intent', intent.id);
  address.searchParams.set('redirect_status', failure === null ? 'succeeded' : 'failed');
  return onward(address.href);
}

function notFound(): PageAnswer {
  return page(renderMessage('Not found', 'There is no payment page at this address.', null), 404);
}

/** Answers the pages for people; `form` is null for GET. */
export function answerPage(runtime: Runtime, path: string, form: URLSearchParams | null): PageAnswer {
  runtime.refresh();
  if (path === '/' && form === null) return page(renderHome(runtime.world));
  const session = /^\/pay\/(cs_test_\w+)(\/challenge)?$/.exec(path);
  if (session !== null) return answerSession(runtime, session[1] ?? '', session[2] !== undefined, form);
  const intent = /^\/challenge\/(pi_\w+)$/.exec(path);
  return intent === null ? notFound() : answerIntent(runtime, intent[1] ?? '', form);
}
