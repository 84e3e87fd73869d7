import { showAmount } from '../amounts';
import { testCards } from '../cards';
import type { World } from '../world';
import { escapeHtml, renderPage } from './page';

const SHOWN = 20;

/** What this server is, which cards it knows and what was paid last. */
export function renderHome(world: World): string {
  const cards = testCards
    .map(
      (card) =>
        `<tr><td class="number">${card.number.replace(/(\d{4})(?=\d)/g, '$1 ')}</td><td>${escapeHtml(card.label)}</td></tr>`,
    )
    .join('');
  const charges = Object.values(world.state.charges)
    .slice(-SHOWN)
    .reverse()
    .map((charge) => {
      const refunded =
        charge.amount_refunded > 0 ? `, refunded ${showAmount(charge.amount_refunded, charge.currency)}` : '';
      const state = `${charge.status}${refunded}${charge.disputed ? ', disputed' : ''}`;
      return `<tr><td>${showAmount(charge.amount, charge.currency)}</td><td>${escapeHtml(charge.description ?? '')}</td><td>${escapeHtml(state)}</td></tr>`;
    })
    .join('');
  const paid =
    charges === ''
      ? '<p>No payment yet. Open an invoice in Moiety and pay it by card.</p>'
      : `<table><thead><tr><th scope="col">Amount</th><th scope="col">For</th><th scope="col">State</th></tr></thead><tbody>${charges}</tbody></table>`;
  return renderPage(
    'Local test payments',
    `<h1>Local test payments</h1>
<p>This server stands for Stripe on this machine. It takes test cards only, with any later month and any three digits.</p>
<h2>Last payments</h2>
${paid}
<h2>Test cards</h2>
<table><thead><tr><th scope="col">Number</th><th scope="col">What happens</th></tr></thead><tbody>${cards}</tbody></table>`,
  );
}
