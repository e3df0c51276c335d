// Stands in for zod's list of about fifty languages in the web bundle (metro.config.js): the product speaks one.
import { config } from 'zod/v4/core/core.js';

export { default as en } from 'zod/v4/locales/en.js';

// zod tries `new Function` to find out whether it may; the content security policy refuses and the browser reports
// it as an error. Said here because this module loads with zod itself, before any schema can be made.
config({ jitless: true });
