import type Stripe from 'stripe';
import { missing } from './api-error';
import { decideDispute, evidenceTexts, updateDispute } from './disputes';
import { listPage, readPaging } from './lists';
import type { Parameters } from './parameters';
import type { Routes } from './route';
import type { World } from './world';

function findDispute(world: World, id: string): Stripe.Dispute {
  const dispute = world.state.disputes[id];
  if (dispute === undefined) throw missing('dispute', id);
  return dispute;
}

function readEvidence(parameters: Parameters): Record<string, string> {
  const evidence = parameters.child('evidence');
  if (evidence === null) return {};
  const given = evidenceTexts.flatMap((name) => {
    const text = evidence.text(name, 20_000);
    return text === null ? [] : [[name, text] as const];
  });
  return Object.fromEntries(given);
}

export const disputeRoutes: Routes = {
  'GET /v1/disputes/:id': (world, parameters, id) => {
    parameters.finish();
    return findDispute(world, id);
  },
  'POST /v1/disputes/:id': (world, parameters, id) => {
    const dispute = findDispute(world, id);
    const evidence = readEvidence(parameters);
    const metadata = parameters.metadata(dispute.metadata);
    const submits = parameters.flag('submit') ?? Object.keys(evidence).length > 0;
    parameters.finish();
    updateDispute(world, dispute, { evidence, metadata, submits });
    return dispute;
  },
  'POST /v1/disputes/:id/close': (world, parameters, id) => {
    parameters.finish();
    const dispute = findDispute(world, id);
    // Closing accepts the loss; an inquiry ends without money.
    decideDispute(world, dispute, dispute.status.startsWith('warning_'));
    return dispute;
  },
  'GET /v1/disputes': (world, parameters) => {
    const paging = readPaging(parameters);
    const charge = parameters.text('charge');
    const intent = parameters.text('payment_intent');
    parameters.finish();
    const found = Object.values(world.state.disputes).filter(
      (dispute) =>
        (charge === null || dispute.charge === charge) &&
        (intent === null || dispute.payment_intent === intent),
    );
    return listPage(found, paging, '/v1/disputes');
  },
};
