/** The list itself is the layout of Prices; nothing is chosen here. */
export default function PricesRoute() {
  return null;
}
