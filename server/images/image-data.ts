/** The browser's ImageData, as much of it as the @jsquash codecs make and read. */
class PlainImageData {
  readonly data: Uint8ClampedArray;
  readonly width: number;
  readonly height: number;

  constructor(data: Uint8ClampedArray, width: number, height: number) {
    this.data = data;
    this.width = width;
    this.height = height;
  }
}

// The codecs name the class as a global, which Node does not have.
Object.assign(globalThis, { ImageData: globalThis.ImageData ?? PlainImageData });
