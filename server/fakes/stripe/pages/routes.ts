import express, { Router, type NextFunction, type Request, type Response } from 'express';
import { Fault } from '../errors.ts';
import { complain } from '../log.ts';
import { parseForm } from '../params.ts';
import { inTurn, reading, type Service } from '../service.ts';
import { read, readKept, type Kept } from '../store.ts';
import { NO_REQUEST, type Work } from '../work.ts';
import type { Form } from './card-form.ts';
import { answerChallenge, payCheckout, successAddress, type Attempt } from './checkout-pay.ts';
import { challengePage, checkoutPage, closedPage } from './checkout.ts';
import { html, pageOf } from './html.ts';
import { portalPage, setEnding, useCard } from './portal.ts';
import { receiptPage } from './receipt.ts';

/** What to send: a page with its status, or where to go next. */
type Reply = { status: number; page: string } | { to: string };

function send(res: Response, reply: Reply): void {
  if ('to' in reply) res.redirect(303, reply.to);
  else res.status(reply.status).type('html').send(reply.page);
}

function formOf(req: Request): Form {
  return typeof req.body === 'string' ? (parseForm(req.body) as Form) : {};
}

/** A form of this page only: another site cannot press its buttons. */
function refuseForeignForms(req: Request, _res: Response, next: NextFunction): void {
  if (req.method === 'POST' && req.get('sec-fetch-site') === 'cross-site') {
    throw new Fault(403, { type: 'invalid_request_error', message: 'This form was sent from another site.' });
  }
  next();
}

function refuse(error: unknown, _req: Request, res: Response, _next: NextFunction): void {
  if (!(error instanceof Fault)) complain('page', error);
  const [status, message] = error instanceof Fault ? [error.status, error.message] : [500, 'The payment fake failed.'];
  const body = html`<h1>This did not work</h1>
    <p role="alert">${message}</p>`;
  res.status(status).type('html').send(pageOf('Error', body));
}

/** What a session that is not open shows; undefined when it is open. */
function closedReply(kept: Kept<'checkout.session'>): Reply | undefined {
  if (kept.data.status === 'complete') return { to: successAddress(kept.data) };
  return kept.data.status === 'expired' ? { status: 410, page: closedPage(kept) } : undefined;
}

async function replyTo(work: Work, id: string, attempt: Attempt, form: Form): Promise<Reply> {
  const kept = await readKept(work.db, 'checkout.session', id);
  if (attempt.outcome === 'paid') return { to: successAddress(kept.data) };
  if (attempt.outcome === 'challenge') return { to: `/checkout/${id}/challenge` };
  // 200: a browser would log any other status as an error of its own.
  return { status: 200, page: await checkoutPage(work.db, kept, form, attempt.message) };
}

function checkoutRoutes(service: Service, router: Router): void {
  router.get('/checkout/:id', async (req, res) => {
    const reply = await reading(service, NO_REQUEST, async ({ db }): Promise<Reply> => {
      const kept = await readKept(db, 'checkout.session', req.params.id);
      return closedReply(kept) ?? { status: 200, page: await checkoutPage(db, kept, {}, null) };
    });
    send(res, reply);
  });

  router.get('/checkout/:id/challenge', async (req, res) => {
    const kept = await readKept(service.db, 'checkout.session', req.params.id);
    const page: Reply = kept.hidden.challenged
      ? { status: 200, page: challengePage(kept) }
      : { to: `/checkout/${kept.data.id}` };
    send(res, closedReply(kept) ?? page);
  });

  const submit = (act: (work: Work, kept: Kept<'checkout.session'>, form: Form) => Promise<Attempt>) => {
    return async (req: Request<{ id: string }>, res: Response): Promise<void> => {
      const form = formOf(req);
      // One at a time: the second of two presses finds the session complete and is led on.
      const reply = await inTurn(service, NO_REQUEST, async (work): Promise<Reply> => {
        const kept = await readKept(work.db, 'checkout.session', req.params.id);
        return closedReply(kept) ?? replyTo(work, kept.data.id, await act(work, kept, form), form);
      });
      send(res, reply);
    };
  };
  router.post('/checkout/:id', submit(payCheckout));
  router.post(
    '/checkout/:id/challenge',
    submit((work, kept, form) => answerChallenge(work, kept, form.answer === 'complete')),
  );
}

function portalRoutes(service: Service, router: Router): void {
  router.get('/portal/:id', async (req, res) => {
    const page = await reading(service, NO_REQUEST, async (work) =>
      portalPage(work, await read(work.db, 'billing_portal.session', req.params.id), {}, null),
    );
    send(res, { status: 200, page });
  });

  router.post('/portal/:id/:action', async (req, res) => {
    const form = formOf(req);
    const { id, action } = req.params;
    const reply = await inTurn(service, NO_REQUEST, async (work): Promise<Reply> => {
      const session = await read(work.db, 'billing_portal.session', id);
      if (action === 'cancel' || action === 'resume') {
        await setEnding(work, session, form, action === 'cancel');
        return { to: `/portal/${id}` };
      }
      if (action !== 'card')
        throw new Fault(404, { type: 'invalid_request_error', message: 'There is no such action.' });
      const message = await useCard(work, session, form);
      return message === null
        ? { to: `/portal/${id}` }
        : { status: 200, page: await portalPage(work, session, form, message) };
    });
    send(res, reply);
  });
}

/** The pages that the payment provider would host, plainly marked as a test. */
export function pageRouter(service: Service): Router {
  const router = Router();
  router.use(express.text({ type: 'application/x-www-form-urlencoded' }));
  router.use((_req, res, next) => {
    res.set({
      'content-security-policy': "default-src 'none'; style-src 'unsafe-inline'; img-src data:; frame-ancestors 'none'",
      'cache-control': 'no-store',
      'referrer-policy': 'no-referrer',
    });
    next();
  });
  router.use(refuseForeignForms);
  checkoutRoutes(service, router);
  portalRoutes(service, router);
  for (const path of ['/invoices/:id', '/invoices/:id/pdf']) {
    router.get(path, async (req: Request<{ id: string }>, res) => {
      send(res, { status: 200, page: receiptPage(await read(service.db, 'invoice', req.params.id)) });
    });
  }
  router.use((req) => {
    throw new Fault(404, { type: 'invalid_request_error', message: `There is no page at ${req.path}.` });
  });
  router.use(refuse);
  return router;
}
