export function BenchRoute() {
  return <main className="bench" />;
}
