export default function Landing() { return <main className="sheet" id="sheet">x</main>; }
