import * as z from 'zod/mini';

// Without this zod tries `new Function`, which the pages' content security policy forbids and
// browsers report even though zod catches it.
z.config({ jitless: true });

export { z };
