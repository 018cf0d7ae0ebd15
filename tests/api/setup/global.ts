/** The API tests write a lot, so they insist on the throwaway server that `npm run test:api` starts for them. */
export default function setup(): void {
  if (process.env.TEST_DATABASE_ADMIN_URL) return;
  throw new Error(
    "These tests need a throwaway database server. Run them with: npm test, or npm run test:api, or one file: npm run test:api -- tests/api/pickups/log-pickup.test.ts",
  );
}
