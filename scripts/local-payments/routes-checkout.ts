import type Stripe from 'stripe';
import { checkChargeAmount, checkCurrency } from './amounts';
import { invalid, missing } from './api-error';
import { createSession, expireSession, type SessionOptions } from './checkout-sessions';
import { listPage, readPaging } from './lists';
import type { Parameters } from './parameters';
import type { Routes } from './route';
import type { World } from './world';

const SHORTEST = 30 * 60;
const LONGEST = 24 * 3_600;

function findSession(world: World, id: string): Stripe.Checkout.Session {
  const session = world.state.sessions[id];
  if (session === undefined) throw missing('checkout.session', id, 'session');
  return session;
}

function readLine(line: Parameters, at: number): SessionOptions['lines'][number] & { currency: string } {
  const param = `line_items[${at}]`;
  const price = line.child('price_data');
  if (price === null)
    throw invalid(
      `Missing required param: ${param}[price_data].`,
      `${param}[price_data]`,
      'parameter_missing',
    );
  const currency = checkCurrency(price.requiredText('currency'), `${param}[price_data][currency]`);
  const unitAmount = price.requiredInteger('unit_amount');
  if (unitAmount < 0) throw invalid('Invalid non-negative integer', `${param}[price_data][unit_amount]`);
  const product = price.child('product_data');
  if (product === null)
    throw invalid('Give product_data.', `${param}[price_data][product_data]`, 'parameter_missing');
  const name = product.requiredText('name');
  product.text('description');
  product.metadata();
  const quantity = line.integer('quantity') ?? 1;
  if (quantity < 1) throw invalid('Quantity must be at least 1', `${param}[quantity]`);
  return { name, unitAmount, quantity, currency };
}

function readLines(parameters: Parameters): { lines: SessionOptions['lines']; currency: string } {
  const lines = parameters.children('line_items').map(readLine);
  const currency = lines[0]?.currency;
  if (currency === undefined)
    throw invalid('Missing required param: line_items.', 'line_items', 'parameter_missing');
  if (lines.some((line) => line.currency !== currency)) {
    throw invalid('All line items must have the same currency.', 'line_items');
  }
  const total = lines.reduce((sum, line) => sum + line.unitAmount * line.quantity, 0);
  checkChargeAmount(total, currency, 'line_items');
  return { lines, currency };
}

function readExpiry(world: World, parameters: Parameters): number {
  const given = parameters.integer('expires_at');
  if (given === null) return world.now() + LONGEST;
  const from = given - world.now();
  if (from < SHORTEST || from > LONGEST) {
    throw invalid('The expires_at timestamp must be from 30 minutes to 24 hours from now.', 'expires_at');
  }
  return given;
}

function readAddresses(
  parameters: Parameters,
): Pick<SessionOptions, 'uiMode' | 'successUrl' | 'cancelUrl' | 'returnUrl'> {
  const uiMode = parameters.oneOf('ui_mode', ['hosted_page', 'embedded_page', 'elements']) ?? 'hosted_page';
  const successUrl = parameters.address('success_url');
  const cancelUrl = parameters.address('cancel_url');
  const returnUrl = parameters.address('return_url');
  const needed = uiMode === 'hosted_page' ? ('success_url' as const) : ('return_url' as const);
  if ((needed === 'success_url' ? successUrl : returnUrl) === null) {
    throw invalid(`Missing required param: ${needed}.`, needed, 'parameter_missing');
  }
  return { uiMode, successUrl, cancelUrl, returnUrl };
}

export const checkoutRoutes: Routes = {
  'POST /v1/checkout/sessions': (world, parameters) => {
    parameters.requiredText('mode');
    if (parameters.text('mode') !== 'payment')
      throw invalid('This local server knows the mode payment only.', 'mode');
    const addresses = readAddresses(parameters);
    const customer = parameters.text('customer');
    const customerEmail = parameters.email('customer_email');
    if (customer !== null && customerEmail !== null) {
      throw invalid('You may only specify one of these parameters: customer, customer_email.', 'customer');
    }
    if (customer !== null && world.state.customers[customer] === undefined)
      throw missing('customer', customer, 'customer');
    const intent = parameters.child('payment_intent_data');
    parameters.texts('payment_method_types');
    parameters.text('locale');
    parameters.text('submit_type');
    const options: SessionOptions = {
      ...addresses,
      ...readLines(parameters),
      customer,
      customerEmail,
      clientReferenceId: parameters.text('client_reference_id', 200),
      expiresAt: readExpiry(world, parameters),
      metadata: parameters.metadata(),
      intent: { metadata: intent?.metadata() ?? {}, description: intent?.text('description') ?? null },
    };
    parameters.finish();
    return createSession(world, options);
  },
  'GET /v1/checkout/sessions/:id': (world, parameters, id) => {
    parameters.finish();
    return findSession(world, id);
  },
  'POST /v1/checkout/sessions/:id/expire': (world, parameters, id) => {
    parameters.finish();
    const session = findSession(world, id);
    expireSession(world, session);
    return session;
  },
  'GET /v1/checkout/sessions/:id/line_items': (world, parameters, id) => {
    const paging = readPaging(parameters, false);
    parameters.finish();
    findSession(world, id);
    // Lines stand in the order of the page, unlike every other list.
    const lines = [...(world.state.lineItems[id] ?? [])].reverse();
    return listPage(lines, paging, `/v1/checkout/sessions/${id}/line_items`);
  },
  'GET /v1/checkout/sessions': (world, parameters) => {
    const paging = readPaging(parameters);
    const intent = parameters.text('payment_intent');
    const customer = parameters.text('customer');
    const status = parameters.oneOf('status', ['open', 'complete', 'expired']);
    parameters.finish();
    const found = Object.values(world.state.sessions).filter(
      (session) =>
        (intent === null || session.payment_intent === intent) &&
        (customer === null || session.customer === customer) &&
        (status === null || session.status === status),
    );
    return listPage(found, paging, '/v1/checkout/sessions');
  },
};
