export default function Home() {
  return <main>Stillroom</main>;
}
