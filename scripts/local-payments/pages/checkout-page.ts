import type Stripe from 'stripe';
import { showAmount } from '../amounts';
import { escapeHtml, renderMessage, renderPage } from './page';
import { successAddress } from '../checkout-sessions';

export type FieldName = 'number' | 'expiry' | 'securityCode' | 'name' | 'email';

export interface CheckoutForm {
  /** What was typed before and may be shown again; never anything of the card. */
  name: string;
  email: string;
  /** Why the last attempt did not pay. */
  problem: { text: string; field: FieldName | null } | null;
}

interface Field {
  name: FieldName;
  label: string;
  value?: string;
  hint?: string;
  attributes: string;
}

function renderField({ name, label, value, hint, attributes }: Field, form: CheckoutForm): string {
  const isWrong = form.problem?.field === name;
  const described = [...(hint === undefined ? [] : [`${name}-hint`]), ...(isWrong ? ['problem'] : [])].join(
    ' ',
  );
  return `<div>
<label for="${name}">${label}</label>
<input id="${name}" name="${name}" ${attributes}${value === undefined ? '' : ` value="${escapeHtml(value)}"`}${
    isWrong ? ' aria-invalid="true" autofocus' : ''
  }${described === '' ? '' : ` aria-describedby="${described}"`}>
${hint === undefined ? '' : `<p class="hint" id="${name}-hint">${hint}</p>`}
</div>`;
}

function renderLines(lines: readonly Stripe.LineItem[]): string {
  const rows = lines.map((line) => {
    const times = line.quantity === 1 || line.quantity === null ? '' : ` × ${line.quantity}`;
    return `<li><span>${escapeHtml(`${line.description ?? ''}${times}`)}</span> <span class="sum">${showAmount(line.amount_total, line.currency)}</span></li>`;
  });
  return `<ul class="lines">${rows.join('')}</ul>`;
}

/** The page on which the buyer pays; it works without any script. */
export function renderCheckout(
  session: Stripe.Checkout.Session,
  lines: readonly Stripe.LineItem[],
  form: CheckoutForm,
): string {
  const total = showAmount(session.amount_total ?? 0, session.currency ?? 'usd');
  const field = (spec: Field) => renderField(spec, form);
  const problem =
    form.problem === null
      ? ''
      : `<p class="problem" id="problem" role="alert">${escapeHtml(form.problem.text)}</p>`;
  const email = {
    name: 'email' as const,
    label: 'E-mail',
    value: form.email,
    attributes: 'type="email" autocomplete="email" required',
  };
  const back =
    session.cancel_url === null
      ? ''
      : `<a class="button" href="${escapeHtml(session.cancel_url)}">Go back without paying</a>`;
  return renderPage(
    `Pay ${total}`,
    `<h1>Pay by card</h1>
<p class="amount">${total}</p>
${renderLines(lines)}
${problem}
<form method="post" novalidate>
${field(email)}
${field({
  name: 'number',
  label: 'Card number',
  hint: 'A test card, such as 4242 4242 4242 4242. Do not enter a real card.',
  attributes: 'type="text" inputmode="numeric" autocomplete="cc-number" maxlength="23" required',
})}
<div class="pair">
${field({
  name: 'expiry',
  label: 'Expiry',
  hint: 'Month and year, such as 04/40',
  attributes: 'type="text" inputmode="text" autocomplete="cc-exp" maxlength="7" required',
})}
${field({
  name: 'securityCode',
  label: 'Security code',
  hint: 'Any three digits',
  attributes: 'type="text" inputmode="numeric" autocomplete="cc-csc" maxlength="4" required',
})}
</div>
${field({
  name: 'name',
  label: 'Name on card',
  value: form.name,
  attributes: 'type="text" autocomplete="cc-name" maxlength="100" required',
})}
<button class="first" type="submit" name="outcome" value="pay">Pay ${total}</button>
<fieldset>
<legend>Try an outcome</legend>
<p class="hint">These fill in a test card for you.</p>
<button type="submit" name="outcome" value="accept">Accept the payment</button>
<button type="submit" name="outcome" value="decline">Decline the card</button>
<button type="submit" name="outcome" value="challenge">Ask for 3-D Secure</button>
</fieldset>
</form>
${back}`,
  );
}

/** The bank's question to the card's holder. */
export function renderChallenge(amount: number, currency: string): string {
  return renderPage(
    '3-D Secure',
    `<h1>Your bank asks: is this you?</h1>
<p>This stands for the page of the card's bank (3-D Secure).</p>
<p class="amount">${showAmount(amount, currency)}</p>
<form method="post">
<button class="first" type="submit" name="answer" value="accept">Confirm the payment</button>
<button type="submit" name="answer" value="fail">Fail the check</button>
</form>`,
  );
}

/** What stands where a session no longer takes a payment. */
export function renderClosed(session: Stripe.Checkout.Session): string {
  if (session.status === 'complete') {
    return renderMessage('Already paid', 'This payment went through. Nothing more is taken.', {
      href: successAddress(session),
      label: 'Continue',
    });
  }
  return renderMessage(
    'This page has expired',
    'It no longer takes a payment. Open the invoice again to start a new one.',
    session.cancel_url === null ? null : { href: session.cancel_url, label: 'Go back' },
  );
}
