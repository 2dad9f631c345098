import { expect, it } from "vitest";
import { scriptsIn } from "@/scripts/page-weight.mjs";

it("a page's scripts are counted once each, without those for browsers that have no modules", () => {
  const html = `<head><script src="/_next/a.js" async=""></script>
    <script src="/_next/old.js" noModule=""></script>
    <script async="" src="/_next/b.js?v=1&amp;w=2"></script>
    <script>self.data = "<p src=none>"</script></head>
    <body><script src="/_next/a.js" async=""></script></body>`;
  expect(scriptsIn(html)).toEqual(["/_next/a.js", "/_next/b.js?v=1&w=2"]);
});
