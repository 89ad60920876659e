import { setLetter } from '../mail/letter';
import type { Mail } from '../mail/mailer';

/*
 * None of these carries words that somebody typed: a sign-up form must not let a stranger write to other people through us.
 * Secrets stand in the fragment of a link, which browsers never send, so that no server or proxy log holds one.
 */

export const confirmLetter = (to: string, publicUrl: string, token: string): Mail =>
  setLetter({
    to,
    subject: 'Confirm your address',
    paragraphs: ['Someone, we hope you, signed up to Oriel with this address. Confirm it to open your household.'],
    action: { label: 'Confirm and begin', href: `${publicUrl}/confirm#${token}` },
    note: 'The link works once, within 24 hours. If it was not you, do nothing: no account is made.',
  });

export const alreadyHereLetter = (to: string, publicUrl: string): Mail =>
  setLetter({
    to,
    subject: 'You have an account already',
    paragraphs: ['Someone, perhaps you, signed up to Oriel with this address. It has an account already, and nothing was changed.'],
    action: { label: 'Sign in', href: `${publicUrl}/sign-in` },
    also: { label: 'Set a new password', href: `${publicUrl}/forgotten` },
    note: 'If it was not you, there is nothing to do.',
  });

export const resetLetter = (to: string, publicUrl: string, token: string): Mail =>
  setLetter({
    to,
    subject: 'Set a new password',
    paragraphs: ['Someone, we hope you, asked to set a new password for your account. Doing so signs you out everywhere.'],
    action: { label: 'Set a new password', href: `${publicUrl}/reset#${token}` },
    note: 'The link works once, within an hour. If it was not you, do nothing: your password stays as it is.',
  });

export const passwordChangedLetter = (to: string, publicUrl: string): Mail =>
  setLetter({
    to,
    subject: 'Your password was changed',
    paragraphs: ['The password of your Oriel account was changed just now, and other browsers were signed out.'],
    action: { label: 'Sign in', href: `${publicUrl}/sign-in` },
    also: { label: 'It was not me: set a new password', href: `${publicUrl}/forgotten` },
    note: 'If it was you, there is nothing to do.',
  });
