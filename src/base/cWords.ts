/** Words that cannot name anything in C99 or C++17 (ISO/IEC 9899:1999, 6.4.1; ISO/IEC 14882:2017, 5.11). From memory. */
const words = new Set((
  'auto break case char const continue default do double else enum extern float for goto if inline int long register restrict return short ' +
  'signed sizeof static struct switch typedef union unsigned void volatile while _Bool _Complex _Imaginary ' +
  'alignas alignof and and_eq asm bitand bitor bool catch char16_t char32_t class compl constexpr const_cast decltype delete dynamic_cast explicit ' +
  'export false friend mutable namespace new noexcept not not_eq nullptr operator or or_eq private protected public reinterpret_cast static_assert ' +
  'static_cast template this thread_local throw true try typeid typename using virtual wchar_t xor xor_eq'
).split(' '));

/** Names of <stdint.h>, which the header includes (ISO/IEC 9899:1999, 7.18), and of what compilers define by themselves. From memory. */
const taken = /^(?:u?int(?:_least|_fast)?(?:8|16|32|64)_t|u?int(?:ptr|max)_t|U?INT(?:_LEAST|_FAST|PTR|MAX)?\d*_(?:MIN|MAX|C)|(?:PTRDIFF|SIG_ATOMIC|WCHAR|WINT|SIZE)_(?:MIN|MAX)|main|linux|unix|i386|NULL|STDINT)$/;

/** True for a name that a header for C and C++ may use. What begins with an underscore belongs to compilers and their libraries. */
export const isNameInC = (name: string): boolean => /^[A-Za-z][A-Za-z0-9_]{0,62}$/.test(name) && !words.has(name) && !taken.test(name);
