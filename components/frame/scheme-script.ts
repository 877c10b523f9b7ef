export const schemeKey = 'heddle-scheme';

/**
 * Runs before the first paint, so that no page flashes in the wrong scheme, and follows the system while nothing is chosen.
 * `data-scheme` on the root is always 'light' or 'dark'; the choice itself ('light', 'dark', or none for the system) is kept in the browser.
 */
export const schemeScript = `(function(){var m=matchMedia('(prefers-color-scheme: dark)');function a(){var s=null;try{s=localStorage.getItem('${schemeKey}')}catch(e){}document.documentElement.dataset.scheme=s==='dark'||s==='light'?s:m.matches?'dark':'light'}a();m.addEventListener('change',a);addEventListener('storage',a);addEventListener('${schemeKey}',a)})()`;
