import { loadDemoOnce } from './load-demo.ts';

// node --import tsx seeds/load.ts: the demo shop, on first run.
try {
  await loadDemoOnce();
  // The picture workers wait for more; there is none.
  process.exit(0);
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  process.exit(1);
}
