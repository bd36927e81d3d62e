import type { NextFunction, Request, Response } from 'express';
import { setTimeout as wait } from 'node:timers/promises';
import { readControl, updateControl, type InjectedFault } from './control-settings.ts';
import { Fault } from './errors.ts';
import { takeTurn } from './schema.ts';
import type { Service } from './service.ts';

const MESSAGES: Record<number, Fault['body']> = {
  429: { type: 'invalid_request_error', code: 'rate_limit', message: 'Too many requests hit the API too quickly.' },
};

/** Uses up one turn of a fault that was set for this path, if any. */
async function takeFault(service: Service, path: string): Promise<InjectedFault | undefined> {
  const isFor = (fault: InjectedFault) => path.startsWith(fault.prefix);
  if (!(await readControl(service.db)).faults.some(isFor)) return undefined;
  return service.db.transaction(async (trx) => {
    await takeTurn(trx);
    const { faults } = await readControl(trx);
    const index = faults.findIndex(isFor);
    const fault = faults[index];
    if (!fault) return undefined;
    const left = { ...fault, times: fault.times - 1 };
    await updateControl(trx, { faults: faults.toSpliced(index, 1, ...(left.times > 0 ? [left] : [])) });
    return fault;
  });
}

async function cut(res: Response, afterMs: number): Promise<void> {
  await wait(afterMs);
  res.socket?.destroy();
}

/** Makes requests fail as the control plane asked: refused, cut off, or acted out with the answer lost. */
export function injectFaults(service: Service) {
  return async (req: Request, res: Response, next: NextFunction): Promise<void> => {
    const fault = await takeFault(service, req.originalUrl);
    if (!fault) return next();
    if (fault.when === 'after') {
      // The answer's headers and body go nowhere; what the request did stays done.
      res.json = () => {
        void cut(res, fault.timeoutMs ?? 0);
        return res;
      };
      return next();
    }
    if (fault.status === undefined) return cut(res, fault.timeoutMs ?? 0);
    throw new Fault(
      fault.status,
      MESSAGES[fault.status] ?? { type: 'api_error', message: 'An unknown error occurred (set by the control plane).' },
    );
  };
}
