import { bootstrapApplication } from '@angular/platform-browser';
import * as z from 'zod';
import { App } from './app/app';
import { appConfig } from './app/app.config';

// The content security policy forbids compiling functions, which zod would otherwise try.
z.config({ jitless: true });

await bootstrapApplication(App, appConfig);
