/** Runs before anything is painted, so that a chosen theme never flashes the other. Keep the key in step with theme-choice.tsx. */
export const themeScript =
  "try{var t=localStorage.getItem('quadrel.theme');if(t==='light'||t==='dark')document.documentElement.dataset.theme=t}catch(e){}";
