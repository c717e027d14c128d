// Says at once when a chosen file is larger than what is taken, before it is sent. The server says it, too.
for (const input of document.querySelectorAll("input[type=file][data-largest]")) {
  input.addEventListener("change", () => {
    const file = input.files[0];
    const tooLarge = file !== undefined && file.size > Number(input.dataset.largest);
    const fault = document.getElementById(input.id + "-large");
    input.setCustomValidity(tooLarge ? input.dataset.tooLarge : "");
    fault.hidden = !tooLarge;
    fault.textContent = tooLarge ? input.dataset.tooLarge : "";
    if (tooLarge) {
      input.setAttribute("aria-invalid", "true");
    } else {
      input.removeAttribute("aria-invalid");
    }
  });
}
