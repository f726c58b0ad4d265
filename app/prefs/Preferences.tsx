'use client';
import { useEffect } from 'react';
import { startTicking } from '../live/tick';
import { keepPrefs, prefsStore } from './prefs';
import { followTheme } from './theme';

/** Takes up this browser's preferences, follows the theme and starts the page's one timer. Shows nothing. */
export function Preferences() {
  useEffect(() => {
    const stops = [keepPrefs(window.localStorage), followTheme(prefsStore), startTicking()];
    return () => stops.forEach((stop) => stop());
  }, []);
  return null;
}
