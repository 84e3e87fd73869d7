import { makeAvailable } from './balance';
import { bookLate } from './charges';
import { expireSession } from './checkout-sessions';
import { decideDispute, endDispute, openDispute } from './disputes';
import { settlePayout } from './payouts';
import { failRefund, settleRefund } from './refunds';
import type { Task } from './state';
import type { World } from './world';

/** What happens by itself when its time has come. Each does nothing when something else came first. */
const work: Record<Task['kind'], (world: World, id: string) => void> = {
  'expire-session': (world, id) => {
    const session = world.state.sessions[id];
    if (session?.status === 'open') expireSession(world, session);
  },
  'open-dispute': (world, id) => {
    const charge = world.state.charges[id];
    if (charge !== undefined && !charge.disputed) openDispute(world, charge);
  },
  'end-dispute': (world, id) => {
    const dispute = world.state.disputes[id];
    if (dispute !== undefined) endDispute(world, dispute);
  },
  'win-dispute': (world, id) => decide(world, id, true),
  'lose-dispute': (world, id) => decide(world, id, false),
  'settle-refund': (world, id) => {
    const refund = world.state.refunds[id];
    if (refund !== undefined) settleRefund(world, refund);
  },
  'fail-refund': (world, id) => {
    const refund = world.state.refunds[id];
    if (refund?.status === 'succeeded' || refund?.status === 'pending') failRefund(world, refund);
  },
  'book-charge': bookLate,
  'make-available': makeAvailable,
  'pay-payout': (world, id) => {
    const payout = world.state.payouts[id];
    if (payout !== undefined) settlePayout(world, payout);
  },
};

function decide(world: World, id: string, isWon: boolean): void {
  const dispute = world.state.disputes[id];
  if (dispute === undefined || ['won', 'lost', 'warning_closed'].includes(dispute.status)) return;
  decideDispute(world, dispute, isWon);
}

/** @returns whether anything was due; what it causes in turn is worked off too */
export function runDueTasks(world: World): boolean {
  let hasRun = false;
  for (;;) {
    const due = world.state.tasks.filter((task) => task.at <= world.now());
    if (due.length === 0) return hasRun;
    hasRun = true;
    world.state.tasks = world.state.tasks.filter((task) => !due.includes(task));
    for (const task of due.sort((a, b) => a.at - b.at)) work[task.kind](world, task.id);
  }
}
