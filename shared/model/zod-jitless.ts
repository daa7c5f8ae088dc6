import * as z from 'zod';

// The schema compiler probes `new Function`, which the content security policy of the client refuses.
z.config({ jitless: true });
