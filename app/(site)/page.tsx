export default function Home() {
  return <h1>From a shape, a material and two terminals to a resistance you can defend</h1>;
}
