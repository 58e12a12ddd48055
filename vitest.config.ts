import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    include: ['{app,domain,evidence,server,local,seeds,tests}/**/*.test.{ts,tsx}'],
    environment: 'node',
  },
});
