/** npm run -s schema: the JSON Schema of the circuit document, on standard output. */
import { z } from 'zod';
import { circuitDocument } from '#shared/circuit/schema.ts';

process.stdout.write(`${JSON.stringify(z.toJSONSchema(circuitDocument, { io: 'input' }), null, 2)}\n`);
