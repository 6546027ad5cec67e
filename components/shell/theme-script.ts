export const THEME_KEY = 'heartcut-theme';

/**
 * Runs before the first paint, so that a chosen theme never flashes in the other one. Inline, with the nonce of the
 * page; reads one key of the browser's own storage and accepts nothing but the two names.
 */
export const THEME_SCRIPT = `try{var t=localStorage.getItem('${THEME_KEY}');if(t==='light'||t==='dark')document.documentElement.dataset.theme=t}catch(e){}`;
