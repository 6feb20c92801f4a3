import { Link } from 'react-router-dom';

export function NotFound() {
  return (
    <main className="plain-page">
      <h1 className="text-22">There is no page at this address</h1>
      <p>The circuit on this device is untouched.</p>
      <Link to="/" className="button-primary">
        Open the bench
      </Link>
    </main>
  );
}
