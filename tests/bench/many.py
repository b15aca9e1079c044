"""A phone that has been used for years: many setups in the store."""

from tests.browser.phone import Phone

# Whatever the form of a record, copies of one that the app has saved itself are right.
COPIES = """async (count) => {
  const database = await new Promise((resolve, reject) => {
    const request = indexedDB.open("sag-and-bounce");
    request.onsuccess = () => resolve(request.result);
    request.onerror = () => reject(request.error);
  });
  const all = (store) =>
    new Promise((resolve) => {
      const [keys, texts] = [store.getAllKeys(), store.getAll()];
      store.transaction.oncomplete = () => resolve([keys.result, texts.result]);
    });
  const open = (mode) => database.transaction("records", mode).objectStore("records");
  const [keys, texts] = await all(open("readonly"));
  const at = keys.findIndex((key) => key.startsWith("setup/"));
  const first = keys[at].slice("setup/".length);
  const store = open("readwrite");
  for (let number = 1; number < count; number += 1) {
    const key = first.slice(0, -6) + number.toString(16).padStart(6, "0");
    store.put(texts[at].replaceAll(first, key), `setup/${key}`);
  }
  await new Promise((resolve) => (store.transaction.oncomplete = resolve));
  const [after] = await all(open("readonly"));
  database.close();
  return after.filter((key) => key.startsWith("setup/")).length;
}"""


def save_many(context, address, count):
    """Save one setup by hand, and copies of it until there are `count`."""
    phone = Phone(context, address).open()
    phone.press("Measure sag")
    phone.type_into("Sag reading", "30")
    phone.sees("20.0 ± 1.3 %")
    phone.page.wait_for_timeout(500)  # saving is done a moment after showing
    assert phone.page.evaluate(COPIES, count) == count
    phone.page.close()
