/// <reference lib="webworker" />
import type { ToTracker } from './tracking-messages';
import { TrackingSession } from './tracking-session';

const session = new TrackingSession((message) => self.postMessage(message));
self.onmessage = ({ data }: MessageEvent<ToTracker>) => void session.hear(data);
