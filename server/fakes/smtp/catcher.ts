import { once } from 'node:events';
import type { AddressInfo } from 'node:net';
import { letterApp } from './http.ts';
import { openLetterStore } from './letter-store.ts';
import type { CatcherSettings } from './settings.ts';
import { newSmtpServer } from './smtp.ts';

export interface RunningCatcher {
  smtpPort: number;
  httpPort: number;
  close: () => Promise<void>;
}

/** Starts both servers on 127.0.0.1 and resolves once they listen. */
export async function startCatcher({ smtpPort, httpPort, folder }: CatcherSettings): Promise<RunningCatcher> {
  const store = await openLetterStore(folder);
  const smtp = newSmtpServer(store);
  const mail = smtp.listen(smtpPort, '127.0.0.1');
  await once(mail, 'listening');
  const web = letterApp(store).listen(httpPort, '127.0.0.1');
  await once(web, 'listening');
  return {
    smtpPort: (mail.address() as AddressInfo).port,
    httpPort: (web.address() as AddressInfo).port,
    async close() {
      web.close();
      web.closeAllConnections();
      await new Promise<void>((resolve) => smtp.close(() => resolve()));
    },
  };
}
