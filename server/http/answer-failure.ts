import type { ErrorRequestHandler } from 'express';
import { MulterError } from 'multer';
import { ZodError } from 'zod';
import type { Failure } from '@oriel/shared/contracts/failure';
import { DomainFailure } from './failure';

const fromZod = (error: ZodError) => {
  const fields = Object.fromEntries(error.issues.map((issue) => [issue.path.join('.'), issue.message]));
  return new DomainFailure(400, 'not-understood', 'Some of what was sent is not right.', 'Mend the fields marked and send again.', { fields });
};

const fromMulter = (error: MulterError) =>
  error.code === 'LIMIT_FILE_SIZE'
    ? new DomainFailure(413, 'file-too-large', 'This file is larger than 100 MB.', 'Choose a smaller file.')
    : new DomainFailure(400, 'upload-not-understood', 'The upload arrived in a form that is not understood.', 'Send one file in the field "file".');

const hasStatus = (error: unknown): error is { status: number } =>
  typeof error === 'object' && error !== null && 'status' in error && typeof error.status === 'number';

function domainFailure(error: unknown): DomainFailure {
  if (error instanceof DomainFailure) return error;
  if (error instanceof ZodError) return fromZod(error);
  if (error instanceof MulterError) return fromMulter(error);
  if (hasStatus(error) && error.status >= 400 && error.status < 500)
    return new DomainFailure(error.status, 'not-understood', 'The request could not be read.', 'Reload the page and try again.');
  return new DomainFailure(500, 'unexpected', 'Something went wrong on the server.', 'Nothing that you did is lost. Try again in a moment.');
}

/** Turns whatever was thrown into the one failure shape; only what nobody foresaw is logged as an error. */
export const answerFailure: ErrorRequestHandler = (error: unknown, request, response, next) => {
  if (response.headersSent) return next(error);
  // An upload cut off by whoever sent it: nothing failed here, and there is nobody to tell.
  if (request.socket.destroyed) return request.log.debug({ err: error }, 'the asker went away');
  const failure = domainFailure(error);
  if (failure.status >= 500 && failure !== error) request.log.error({ err: error }, 'unexpected failure');
  const body: Failure = {
    code: failure.code,
    message: failure.message,
    remedy: failure.remedy,
    ...failure.more,
    reference: String(request.id),
  };
  response.status(failure.status).json(body);
};
