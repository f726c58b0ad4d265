import { PREFS_KEY } from './prefs';

/** Runs before the first paint: the theme kept in this browser, else the one the machine asks for. */
export const themeScript = `(function(){var t='auto';try{t=JSON.parse(localStorage.getItem('${PREFS_KEY}')||'{}').theme||t}catch(e){}
if(t!=='night'&&t!=='day')t=matchMedia('(prefers-color-scheme: light)').matches?'day':'night';document.documentElement.dataset.theme=t})()`;
