import { checkCurrency } from './amounts';
import { invalid, missing } from './api-error';
import { sumBalance } from './balance';
import { listPage, readPaging } from './lists';
import { createPayout } from './payouts';
import type { Routes } from './route';
import { newId } from './world';

const balance: Routes = {
  'GET /v1/balance': (world, parameters) => {
    parameters.finish();
    return sumBalance(world);
  },
  'GET /v1/balance_transactions/:id': (world, parameters, id) => {
    parameters.finish();
    const line = world.state.balance[id];
    if (line === undefined) throw missing('balance transaction', id);
    return line;
  },
  'GET /v1/balance_transactions': (world, parameters) => {
    const paging = readPaging(parameters);
    const payout = parameters.text('payout');
    const source = parameters.text('source');
    const type = parameters.text('type');
    const currency = parameters.text('currency');
    parameters.finish();
    if (payout !== null && world.state.payouts[payout]?.automatic === false) {
      throw invalid(
        'Balance transaction history can only be filtered on automatic transfers, not manual.',
        'payout',
      );
    }
    const found = Object.values(world.state.balance).filter(
      (line) =>
        (payout === null || world.state.payoutOf[line.id] === payout) &&
        (source === null || line.source === source) &&
        (type === null || line.type === type) &&
        (currency === null || line.currency === currency),
    );
    return listPage(found, paging, '/v1/balance_transactions');
  },
};

const payouts: Routes = {
  'POST /v1/payouts': (world, parameters) => {
    const amount = parameters.requiredInteger('amount');
    if (amount < 1) throw invalid('Invalid positive integer', 'amount', 'parameter_invalid_integer');
    const options = {
      amount,
      currency: checkCurrency(parameters.requiredText('currency')),
      description: parameters.text('description'),
      metadata: parameters.metadata(),
      isAutomatic: false,
    };
    parameters.finish();
    return createPayout(world, options);
  },
  'GET /v1/payouts/:id': (world, parameters, id) => {
    parameters.finish();
    const payout = world.state.payouts[id];
    if (payout === undefined) throw missing('payout', id);
    return payout;
  },
  'GET /v1/payouts': (world, parameters) => {
    const paging = readPaging(parameters);
    const status = parameters.text('status');
    parameters.finish();
    const found = Object.values(world.state.payouts).filter(
      (payout) => status === null || payout.status === status,
    );
    return listPage(found, paging, '/v1/payouts');
  },
};

const events: Routes = {
  'GET /v1/events/:id': (world, parameters, id) => {
    parameters.finish();
    const event = world.state.events[id];
    if (event === undefined) throw missing('event', id);
    return event;
  },
  'GET /v1/events': (world, parameters) => {
    const paging = readPaging(parameters);
    const type = parameters.text('type');
    const types = parameters.texts('types');
    parameters.finish();
    const found = Object.values(world.state.events).filter(
      (event) => (type === null || event.type === type) && (types.length === 0 || types.includes(event.type)),
    );
    return listPage(found, paging, '/v1/events');
  },
};

const customers: Routes = {
  'POST /v1/customers': (world, parameters) => {
    const given = {
      email: parameters.email('email'),
      name: parameters.text('name'),
      description: parameters.text('description'),
      metadata: parameters.metadata(),
    };
    parameters.finish();
    const id = newId('cus');
    world.state.customers[id] = {
      id,
      object: 'customer',
      balance: 0,
      created: world.now(),
      default_source: null,
      ...given,
      invoice_settings: {
        custom_fields: null,
        default_payment_method: null,
        footer: null,
        rendering_options: null,
      },
      livemode: false,
      shipping: null,
    };
    world.emit('customer.created', world.state.customers[id]);
    return world.state.customers[id];
  },
  'GET /v1/customers/:id': (world, parameters, id) => {
    parameters.finish();
    if (world.state.customers[id] === undefined) throw missing('customer', id);
    return world.state.customers[id];
  },
  'POST /v1/customers/:id': (world, parameters, id) => {
    const customer = world.state.customers[id];
    if (customer === undefined) throw missing('customer', id);
    const email = parameters.has('email') ? parameters.email('email') : customer.email;
    const name = parameters.has('name') ? parameters.text('name') : customer.name;
    const description = parameters.has('description') ? parameters.text('description') : customer.description;
    const metadata = parameters.metadata(customer.metadata);
    parameters.finish();
    return world.change(customer, ['customer.updated'], (changed) => {
      Object.assign(changed, { email, name, description, metadata });
    });
  },
  'DELETE /v1/customers/:id': (world, parameters, id) => {
    parameters.finish();
    const customer = world.state.customers[id];
    if (customer === undefined) throw missing('customer', id);
    delete world.state.customers[id];
    world.emit('customer.deleted', customer);
    return { id, object: 'customer', deleted: true };
  },
  'GET /v1/customers': (world, parameters) => {
    const paging = readPaging(parameters);
    const email = parameters.text('email');
    parameters.finish();
    const found = Object.values(world.state.customers).filter(
      (customer) => email === null || customer.email === email,
    );
    return listPage(found, paging, '/v1/customers');
  },
};

export const accountRoutes: Routes = { ...balance, ...payouts, ...events, ...customers };
