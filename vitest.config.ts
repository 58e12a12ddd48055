import { defineConfig } from 'vitest/config';

// Tests that want MariaDB and the object store get them from this set-up; the others run without.
const services = {
  globalSetup: ['tests/setup/services.ts'],
  setupFiles: ['tests/setup/environment.ts'],
};

// Photographs of real cameras are not part of the project.
const withRealPhotos = Boolean(process.env.WITNESSMARK_REAL_PHOTOS);
const realPhotos = 'tests/outside/photos/real-photos.test.ts';
// This file is read once per project, and it need only be said once.
if (!withRealPhotos && !process.env.REAL_PHOTOS_SAID) {
  process.env.REAL_PHOTOS_SAID = '1';
  console.log(
    'Not run: what photographs of real cameras do. Set WITNESSMARK_REAL_PHOTOS to a folder of them.',
  );
}

export default defineConfig({
  test: {
    allowOnly: false,
    passWithNoTests: false,
    testTimeout: 30_000,
    hookTimeout: 60_000,
    projects: [
      {
        extends: true,
        test: {
          name: 'pure',
          include: [
            '{domain,evidence}/**/*.test.ts',
            'app/*.test.{ts,tsx}',
            'app/{ui,lib}/**/*.test.{ts,tsx}',
            'tests/boundaries.test.ts',
          ],
        },
      },
      {
        extends: true,
        test: {
          name: 'machine',
          include: ['{local,scripts}/**/*.test.ts'],
        },
      },
      {
        extends: true,
        test: {
          name: 'services',
          include: [
            '{server,seeds}/**/*.test.ts',
            'app/routes/**/*.test.{ts,tsx}',
            'tests/**/*.test.ts',
          ],
          exclude: [
            'tests/boundaries.test.ts',
            'tests/{journeys,soak}/**',
            ...(withRealPhotos ? [] : [realPhotos]),
          ],
          ...services,
        },
      },
      {
        extends: true,
        test: {
          name: 'journeys',
          include: ['tests/journeys/**/*.test.ts'],
          testTimeout: 120_000,
          hookTimeout: 120_000,
          // One browser and one server at a time: two cores do not carry more without waiting.
          fileParallelism: false,
          ...services,
        },
      },
      {
        extends: true,
        test: {
          name: 'soak',
          include: ['tests/soak/**/*.test.ts'],
          testTimeout: 3_600_000,
          hookTimeout: 120_000,
          fileParallelism: false,
          ...services,
        },
      },
    ],
  },
});
