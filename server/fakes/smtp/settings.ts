import { z } from 'zod';

const port = z.coerce.number().int().min(0).max(65_535);
const environment = z.object({ FAKE_SMTP_PORT: port, FAKE_SMTP_HTTP_PORT: port, DATA_DIR: z.string().min(1) });

export interface CatcherSettings {
  /** 0 takes any free port. */
  smtpPort: number;
  httpPort: number;
  /** Where caught letters are kept; made when missing. */
  folder: string;
}

/** Reads the catcher's settings; throws one sentence per wrong or missing one. */
export function readCatcherSettings(env: NodeJS.ProcessEnv): CatcherSettings {
  const result = environment.safeParse(env);
  if (!result.success) throw new Error(`Wrong settings of the mail catcher:\n${z.prettifyError(result.error)}`);
  const { FAKE_SMTP_PORT, FAKE_SMTP_HTTP_PORT, DATA_DIR } = result.data;
  return { smtpPort: FAKE_SMTP_PORT, httpPort: FAKE_SMTP_HTTP_PORT, folder: `${DATA_DIR}/letters` };
}
