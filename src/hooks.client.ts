/** Runs before any page's code. */
import { config } from 'zod/v4/core';

// Schemas would otherwise try to compile themselves, which the content security policy forbids and reports.
config({ jitless: true });
