/** The page's head is covered in the browser. */
export default function Head() {
  return null;
}
