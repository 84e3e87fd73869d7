/**
 * Sets the theme before the first paint: the person's choice when there is one, else what the system asks for, and
 * follows the system while the page is open. Stands in `<head>`; a blocking script is the point of it.
 */
export function ThemeScript() {
  const code = `(function(){var m=matchMedia('(prefers-color-scheme: dark)');function set(){var c=null;try{c=localStorage.getItem('moiety-theme')}catch(e){}document.documentElement.classList.toggle('dark',c==='dark'||(c!=='light'&&m.matches))}set();m.addEventListener('change',set);addEventListener('storage',set);addEventListener('moiety-theme',set)})()`;
  return <script dangerouslySetInnerHTML={{ __html: code }} />;
}
