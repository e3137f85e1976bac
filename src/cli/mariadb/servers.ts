/** The database of `npm start` and `npm run dev`: what people entered stays there. */
export const OWN_SERVER = { folder: '.data/mariadb', firstPort: 3317, database: 'sweepwright_app' };

/** The database server of the tests, on another port, so that they run beside the application. */
export const TEST_SERVER = { folder: '.data/test/mariadb', firstPort: 3417 };
