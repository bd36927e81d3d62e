import { gzipSync } from 'node:zlib';
import { chromium } from '@playwright/test';
import type { House, Row } from './run.ts';

/** The script that a visitor's browser loads to show the first recipe, gzipped. */
export async function* benchScript({ url }: House): AsyncGenerator<Row> {
  const browser = await chromium.launch({
    executablePath: '/usr/bin/chromium',
    args: ['--no-sandbox', '--disable-gpu', '--disable-quic'],
  });
  try {
    const page = await browser.newPage({ baseURL: url });
    await page.request.post('/api/session/age', { data: { oldEnough: true }, headers: { origin: url } });
    const scripts: Promise<number>[] = [];
    page.on('response', (response) => {
      if (response.url().endsWith('.js')) scripts.push(response.body().then((body) => gzipSync(body).length));
    });
    await page.goto('/books/slack-water/raspberry-dulse-cordial');
    await page.getByRole('heading', { level: 1 }).waitFor();
    await page.waitForLoadState('networkidle');
    const kilobytes = (await Promise.all(scripts)).reduce((sum, size) => sum + size, 0) / 1000;
    yield {
      name: 'gzipped script of the first reading page',
      value: Math.round(kilobytes * 10) / 10,
      unit: 'kB',
      goal: '<= 200',
      met: kilobytes <= 200,
      detail: { files: scripts.length },
    };
  } finally {
    await browser.close();
  }
}
