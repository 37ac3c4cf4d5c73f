import { z } from 'zod';

// zod's compiled parsers need `new Function`, which the content security policy forbids.
z.config({ jitless: true });
