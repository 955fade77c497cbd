import { usePageTitle } from "../../lib/title";

export default function ChemistryPage() {
  usePageTitle("Chemistry");
  return <h1 className="p-5 text-xl">Chemistry</h1>;
}
