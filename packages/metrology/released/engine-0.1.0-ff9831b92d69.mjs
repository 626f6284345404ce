var __create = Object.create;
var __defProp = Object.defineProperty;
var __getOwnPropDesc = Object.getOwnPropertyDescriptor;
var __getOwnPropNames = Object.getOwnPropertyNames;
var __getProtoOf = Object.getPrototypeOf;
var __hasOwnProp = Object.prototype.hasOwnProperty;
var __commonJS = (cb, mod) => function __require() {
  try {
    return mod || (0, cb[__getOwnPropNames(cb)[0]])((mod = { exports: {} }).exports, mod), mod.exports;
  } catch (e) {
    throw mod = 0, e;
  }
};
var __copyProps = (to, from, except, desc) => {
  if (from && typeof from === "object" || typeof from === "function") {
    for (let key of __getOwnPropNames(from))
      if (!__hasOwnProp.call(to, key) && key !== except)
        __defProp(to, key, { get: () => from[key], enumerable: !(desc = __getOwnPropDesc(from, key)) || desc.enumerable });
  }
  return to;
};
var __toESM = (mod, isNodeMode, target) => (target = mod != null ? __create(__getProtoOf(mod)) : {}, __copyProps(
  // If the importer is in node compatibility mode or this is not an ESM
  // file that has been converted to a CommonJS file using a Babel-
  // compatible transform (i.e. "__esModule" has not been set), then set
  // "default" to the CommonJS "module.exports" for node compatibility.
  isNodeMode || !mod || !mod.__esModule ? __defProp(target, "default", { value: mod, enumerable: true }) : target,
  mod
));

// node_modules/@stdlib/utils-define-property/lib/define_property.js
var require_define_property = __commonJS({
  "node_modules/@stdlib/utils-define-property/lib/define_property.js"(exports, module) {
    "use strict";
    var main = typeof Object.defineProperty === "function" ? Object.defineProperty : null;
    module.exports = main;
  }
});

// node_modules/@stdlib/utils-define-property/lib/has_define_property_support.js
var require_has_define_property_support = __commonJS({
  "node_modules/@stdlib/utils-define-property/lib/has_define_property_support.js"(exports, module) {
    "use strict";
    var defineProperty = require_define_property();
    function hasDefinePropertySupport() {
      try {
        defineProperty({}, "x", {});
        return true;
      } catch (err) {
        return false;
      }
    }
    module.exports = hasDefinePropertySupport;
  }
});

// node_modules/@stdlib/utils-define-property/lib/builtin.js
var require_builtin = __commonJS({
  "node_modules/@stdlib/utils-define-property/lib/builtin.js"(exports, module) {
    "use strict";
    var defineProperty = Object.defineProperty;
    module.exports = defineProperty;
  }
});

// node_modules/@stdlib/string-base-format-interpolate/lib/is_number.js
var require_is_number = __commonJS({
  "node_modules/@stdlib/string-base-format-interpolate/lib/is_number.js"(exports, module) {
    "use strict";
    function isNumber(value) {
      return typeof value === "number";
    }
    module.exports = isNumber;
  }
});

// node_modules/@stdlib/string-base-format-interpolate/lib/zero_pad.js
var require_zero_pad = __commonJS({
  "node_modules/@stdlib/string-base-format-interpolate/lib/zero_pad.js"(exports, module) {
    "use strict";
    function startsWithMinus(str) {
      return str[0] === "-";
    }
    function zeros(n) {
      var out = "";
      var i;
      for (i = 0; i < n; i++) {
        out += "0";
      }
      return out;
    }
    function zeroPad(str, width, right) {
      var negative = false;
      var pad = width - str.length;
      if (pad < 0) {
        return str;
      }
      if (startsWithMinus(str)) {
        negative = true;
        str = str.substr(1);
      }
      str = right ? str + zeros(pad) : zeros(pad) + str;
      if (negative) {
        str = "-" + str;
      }
      return str;
    }
    module.exports = zeroPad;
  }
});

// node_modules/@stdlib/string-base-format-interpolate/lib/format_integer.js
var require_format_integer = __commonJS({
  "node_modules/@stdlib/string-base-format-interpolate/lib/format_integer.js"(exports, module) {
    "use strict";
    var isNumber = require_is_number();
    var zeroPad = require_zero_pad();
    var lowercase = String.prototype.toLowerCase;
    var uppercase = String.prototype.toUpperCase;
    function formatInteger(token) {
      var base;
      var out;
      var i;
      switch (token.specifier) {
        case "b":
          base = 2;
          break;
        case "o":
          base = 8;
          break;
        case "x":
        case "X":
          base = 16;
          break;
        case "d":
        case "i":
        case "u":
        default:
          base = 10;
          break;
      }
      out = token.arg;
      i = parseInt(out, 10);
      if (!isFinite(i)) {
        if (!isNumber(out)) {
          throw new Error("invalid integer. Value: " + out);
        }
        i = 0;
      }
      if (i < 0 && (token.specifier === "u" || base !== 10)) {
        i = 4294967295 + i + 1;
      }
      if (i < 0) {
        out = (-i).toString(base);
        if (token.precision) {
          out = zeroPad(out, token.precision, token.padRight);
        }
        out = "-" + out;
      } else {
        out = i.toString(base);
        if (!i && !token.precision) {
          out = "";
        } else if (token.precision) {
          out = zeroPad(out, token.precision, token.padRight);
        }
        if (token.sign) {
          out = token.sign + out;
        }
      }
      if (base === 16) {
        if (token.alternate) {
          out = "0x" + out;
        }
        out = token.specifier === uppercase.call(token.specifier) ? uppercase.call(out) : lowercase.call(out);
      }
      if (base === 8) {
        if (token.alternate && out.charAt(0) !== "0") {
          out = "0" + out;
        }
      }
      return out;
    }
    module.exports = formatInteger;
  }
});

// node_modules/@stdlib/string-base-format-interpolate/lib/is_string.js
var require_is_string = __commonJS({
  "node_modules/@stdlib/string-base-format-interpolate/lib/is_string.js"(exports, module) {
    "use strict";
    function isString(value) {
      return typeof value === "string";
    }
    module.exports = isString;
  }
});

// node_modules/@stdlib/string-base-format-interpolate/lib/format_double.js
var require_format_double = __commonJS({
  "node_modules/@stdlib/string-base-format-interpolate/lib/format_double.js"(exports, module) {
    "use strict";
    var abs = Math.abs;
    var lowercase = String.prototype.toLowerCase;
    var uppercase = String.prototype.toUpperCase;
    var replace = String.prototype.replace;
    var RE_EXP_POS_DIGITS = /e\+(\d)$/;
    var RE_EXP_NEG_DIGITS = /e-(\d)$/;
    var RE_ONLY_DIGITS = /^(\d+)$/;
    var RE_DIGITS_BEFORE_EXP = /^(\d+)e/;
    var RE_TRAILING_PERIOD_ZERO = /\.0$/;
    var RE_PERIOD_ZERO_EXP = /\.0*e/;
    var RE_ZERO_BEFORE_EXP = /(\..*[^0])0*e/;
    function formatDouble(f, token) {
      var digits;
      var out;
      switch (token.specifier) {
        case "e":
        case "E":
          out = f.toExponential(token.precision);
          break;
        case "f":
        case "F":
          out = f.toFixed(token.precision);
          break;
        case "g":
        case "G":
          if (abs(f) < 1e-4) {
            digits = token.precision;
            if (digits > 0) {
              digits -= 1;
            }
            out = f.toExponential(digits);
          } else {
            out = f.toPrecision(token.precision);
          }
          if (!token.alternate) {
            out = replace.call(out, RE_ZERO_BEFORE_EXP, "$1e");
            out = replace.call(out, RE_PERIOD_ZERO_EXP, "e");
            out = replace.call(out, RE_TRAILING_PERIOD_ZERO, "");
          }
          break;
        default:
          throw new Error("invalid double notation. Value: " + token.specifier);
      }
      out = replace.call(out, RE_EXP_POS_DIGITS, "e+0$1");
      out = replace.call(out, RE_EXP_NEG_DIGITS, "e-0$1");
      if (token.alternate) {
        out = replace.call(out, RE_ONLY_DIGITS, "$1.");
        out = replace.call(out, RE_DIGITS_BEFORE_EXP, "$1.e");
      }
      if (f >= 0 && token.sign) {
        out = token.sign + out;
      }
      out = token.specifier === uppercase.call(token.specifier) ? uppercase.call(out) : lowercase.call(out);
      return out;
    }
    module.exports = formatDouble;
  }
});

// node_modules/@stdlib/string-base-format-interpolate/lib/space_pad.js
var require_space_pad = __commonJS({
  "node_modules/@stdlib/string-base-format-interpolate/lib/space_pad.js"(exports, module) {
    "use strict";
    function spaces(n) {
      var out = "";
      var i;
      for (i = 0; i < n; i++) {
        out += " ";
      }
      return out;
    }
    function spacePad(str, width, right) {
      var pad = width - str.length;
      if (pad < 0) {
        return str;
      }
      str = right ? str + spaces(pad) : spaces(pad) + str;
      return str;
    }
    module.exports = spacePad;
  }
});

// node_modules/@stdlib/string-base-format-interpolate/lib/main.js
var require_main = __commonJS({
  "node_modules/@stdlib/string-base-format-interpolate/lib/main.js"(exports, module) {
    "use strict";
    var formatInteger = require_format_integer();
    var isString = require_is_string();
    var isNumber = require_is_number();
    var formatDouble = require_format_double();
    var spacePad = require_space_pad();
    var zeroPad = require_zero_pad();
    var fromCharCode = String.fromCharCode;
    var isArray = Array.isArray;
    function isnan(value) {
      return value !== value;
    }
    function initialize(token) {
      var out = {};
      out.specifier = token.specifier;
      out.precision = token.precision === void 0 ? 1 : token.precision;
      out.width = token.width;
      out.flags = token.flags || "";
      out.mapping = token.mapping;
      return out;
    }
    function formatInterpolate(tokens) {
      var hasPeriod;
      var flags;
      var token;
      var flag;
      var num;
      var out;
      var pos;
      var f;
      var i;
      var j;
      if (!isArray(tokens)) {
        throw new TypeError("invalid argument. First argument must be an array. Value: `" + tokens + "`.");
      }
      out = "";
      pos = 1;
      for (i = 0; i < tokens.length; i++) {
        token = tokens[i];
        if (isString(token)) {
          out += token;
        } else {
          hasPeriod = token.precision !== void 0;
          token = initialize(token);
          if (!token.specifier) {
            throw new TypeError("invalid argument. Token is missing `specifier` property. Index: `" + i + "`. Value: `" + token + "`.");
          }
          if (token.mapping) {
            pos = token.mapping;
          }
          flags = token.flags;
          for (j = 0; j < flags.length; j++) {
            flag = flags.charAt(j);
            switch (flag) {
              case " ":
                token.sign = " ";
                break;
              case "+":
                token.sign = "+";
                break;
              case "-":
                token.padRight = true;
                token.padZeros = false;
                break;
              case "0":
                token.padZeros = flags.indexOf("-") < 0;
                break;
              case "#":
                token.alternate = true;
                break;
              default:
                throw new Error("invalid flag: " + flag);
            }
          }
          if (token.width === "*") {
            token.width = parseInt(arguments[pos], 10);
            pos += 1;
            if (isnan(token.width)) {
              throw new TypeError("the argument for * width at position " + pos + " is not a number. Value: `" + token.width + "`.");
            }
            if (token.width < 0) {
              token.padRight = true;
              token.width = -token.width;
            }
          }
          if (hasPeriod) {
            if (token.precision === "*") {
              token.precision = parseInt(arguments[pos], 10);
              pos += 1;
              if (isnan(token.precision)) {
                throw new TypeError("the argument for * precision at position " + pos + " is not a number. Value: `" + token.precision + "`.");
              }
              if (token.precision < 0) {
                token.precision = 1;
                hasPeriod = false;
              }
            }
          }
          token.arg = arguments[pos];
          switch (token.specifier) {
            case "b":
            case "o":
            case "x":
            case "X":
            case "d":
            case "i":
            case "u":
              if (hasPeriod) {
                token.padZeros = false;
              }
              token.arg = formatInteger(token);
              break;
            case "s":
              token.maxWidth = hasPeriod ? token.precision : -1;
              token.arg = String(token.arg);
              break;
            case "c":
              if (!isnan(token.arg)) {
                num = parseInt(token.arg, 10);
                if (num < 0 || num > 127) {
                  throw new Error("invalid character code. Value: " + token.arg);
                }
                token.arg = isnan(num) ? String(token.arg) : fromCharCode(num);
              }
              break;
            case "e":
            case "E":
            case "f":
            case "F":
            case "g":
            case "G":
              if (!hasPeriod) {
                token.precision = 6;
              }
              f = parseFloat(token.arg);
              if (!isFinite(f)) {
                if (!isNumber(token.arg)) {
                  throw new Error("invalid floating-point number. Value: " + out);
                }
                f = token.arg;
                token.padZeros = false;
              }
              token.arg = formatDouble(f, token);
              break;
            default:
              throw new Error("invalid specifier: " + token.specifier);
          }
          if (token.maxWidth >= 0 && token.arg.length > token.maxWidth) {
            token.arg = token.arg.substring(0, token.maxWidth);
          }
          if (token.padZeros) {
            token.arg = zeroPad(token.arg, token.width || token.precision, token.padRight);
          } else if (token.width) {
            token.arg = spacePad(token.arg, token.width, token.padRight);
          }
          out += token.arg || "";
          pos += 1;
        }
      }
      return out;
    }
    module.exports = formatInterpolate;
  }
});

// node_modules/@stdlib/string-base-format-interpolate/lib/index.js
var require_lib = __commonJS({
  "node_modules/@stdlib/string-base-format-interpolate/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main();
    module.exports = main;
  }
});

// node_modules/@stdlib/string-base-format-tokenize/lib/main.js
var require_main2 = __commonJS({
  "node_modules/@stdlib/string-base-format-tokenize/lib/main.js"(exports, module) {
    "use strict";
    var RE = /%(?:([1-9]\d*)\$)?([0 +\-#]*)(\*|\d+)?(?:(\.)(\*|\d+)?)?[hlL]?([%A-Za-z])/g;
    function parse(match) {
      var token = {
        "mapping": match[1] ? parseInt(match[1], 10) : void 0,
        "flags": match[2],
        "width": match[3],
        "precision": match[5],
        "specifier": match[6]
      };
      if (match[4] === "." && match[5] === void 0) {
        token.precision = "1";
      }
      return token;
    }
    function formatTokenize(str) {
      var content;
      var tokens;
      var match;
      var prev;
      tokens = [];
      prev = 0;
      match = RE.exec(str);
      while (match) {
        content = str.slice(prev, RE.lastIndex - match[0].length);
        if (content.length) {
          tokens.push(content);
        }
        if (match[6] === "%") {
          tokens.push("%");
        } else {
          tokens.push(parse(match));
        }
        prev = RE.lastIndex;
        match = RE.exec(str);
      }
      content = str.slice(prev);
      if (content.length) {
        tokens.push(content);
      }
      return tokens;
    }
    module.exports = formatTokenize;
  }
});

// node_modules/@stdlib/string-base-format-tokenize/lib/index.js
var require_lib2 = __commonJS({
  "node_modules/@stdlib/string-base-format-tokenize/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main2();
    module.exports = main;
  }
});

// node_modules/@stdlib/string-format/lib/is_string.js
var require_is_string2 = __commonJS({
  "node_modules/@stdlib/string-format/lib/is_string.js"(exports, module) {
    "use strict";
    function isString(value) {
      return typeof value === "string";
    }
    module.exports = isString;
  }
});

// node_modules/@stdlib/string-format/lib/main.js
var require_main3 = __commonJS({
  "node_modules/@stdlib/string-format/lib/main.js"(exports, module) {
    "use strict";
    var interpolate = require_lib();
    var tokenize = require_lib2();
    var isString = require_is_string2();
    function format(str) {
      var args;
      var i;
      if (!isString(str)) {
        throw new TypeError(format("invalid argument. First argument must be a string. Value: `%s`.", str));
      }
      args = [tokenize(str)];
      for (i = 1; i < arguments.length; i++) {
        args.push(arguments[i]);
      }
      return interpolate.apply(null, args);
    }
    module.exports = format;
  }
});

// node_modules/@stdlib/string-format/lib/index.js
var require_lib3 = __commonJS({
  "node_modules/@stdlib/string-format/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main3();
    module.exports = main;
  }
});

// node_modules/@stdlib/utils-define-property/lib/polyfill.js
var require_polyfill = __commonJS({
  "node_modules/@stdlib/utils-define-property/lib/polyfill.js"(exports, module) {
    "use strict";
    var format = require_lib3();
    var objectProtoype = Object.prototype;
    var toStr = objectProtoype.toString;
    var defineGetter = objectProtoype.__defineGetter__;
    var defineSetter = objectProtoype.__defineSetter__;
    var lookupGetter = objectProtoype.__lookupGetter__;
    var lookupSetter = objectProtoype.__lookupSetter__;
    function defineProperty(obj, prop, descriptor) {
      var prototype;
      var hasValue;
      var hasGet;
      var hasSet;
      if (typeof obj !== "object" || obj === null || toStr.call(obj) === "[object Array]") {
        throw new TypeError(format("invalid argument. First argument must be an object. Value: `%s`.", obj));
      }
      if (typeof descriptor !== "object" || descriptor === null || toStr.call(descriptor) === "[object Array]") {
        throw new TypeError(format("invalid argument. Property descriptor must be an object. Value: `%s`.", descriptor));
      }
      hasValue = "value" in descriptor;
      if (hasValue) {
        if (lookupGetter.call(obj, prop) || lookupSetter.call(obj, prop)) {
          prototype = obj.__proto__;
          obj.__proto__ = objectProtoype;
          delete obj[prop];
          obj[prop] = descriptor.value;
          obj.__proto__ = prototype;
        } else {
          obj[prop] = descriptor.value;
        }
      }
      hasGet = "get" in descriptor;
      hasSet = "set" in descriptor;
      if (hasValue && (hasGet || hasSet)) {
        throw new Error("invalid argument. Cannot specify one or more accessors and a value or writable attribute in the property descriptor.");
      }
      if (hasGet && defineGetter) {
        defineGetter.call(obj, prop, descriptor.get);
      }
      if (hasSet && defineSetter) {
        defineSetter.call(obj, prop, descriptor.set);
      }
      return obj;
    }
    module.exports = defineProperty;
  }
});

// node_modules/@stdlib/utils-define-property/lib/index.js
var require_lib4 = __commonJS({
  "node_modules/@stdlib/utils-define-property/lib/index.js"(exports, module) {
    "use strict";
    var hasDefinePropertySupport = require_has_define_property_support();
    var builtin = require_builtin();
    var polyfill = require_polyfill();
    var defineProperty;
    if (hasDefinePropertySupport()) {
      defineProperty = builtin;
    } else {
      defineProperty = polyfill;
    }
    module.exports = defineProperty;
  }
});

// node_modules/@stdlib/utils-define-nonenumerable-read-only-property/lib/main.js
var require_main4 = __commonJS({
  "node_modules/@stdlib/utils-define-nonenumerable-read-only-property/lib/main.js"(exports, module) {
    "use strict";
    var defineProperty = require_lib4();
    function setNonEnumerableReadOnly(obj, prop, value) {
      defineProperty(obj, prop, {
        "configurable": false,
        "enumerable": false,
        "writable": false,
        "value": value
      });
    }
    module.exports = setNonEnumerableReadOnly;
  }
});

// node_modules/@stdlib/utils-define-nonenumerable-read-only-property/lib/index.js
var require_lib5 = __commonJS({
  "node_modules/@stdlib/utils-define-nonenumerable-read-only-property/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main4();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-assert-is-nan/lib/main.js
var require_main5 = __commonJS({
  "node_modules/@stdlib/math-base-assert-is-nan/lib/main.js"(exports, module) {
    "use strict";
    function isnan(x) {
      return x !== x;
    }
    module.exports = isnan;
  }
});

// node_modules/@stdlib/math-base-assert-is-nan/lib/index.js
var require_lib6 = __commonJS({
  "node_modules/@stdlib/math-base-assert-is-nan/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main5();
    module.exports = main;
  }
});

// node_modules/@stdlib/assert-has-symbol-support/lib/main.js
var require_main6 = __commonJS({
  "node_modules/@stdlib/assert-has-symbol-support/lib/main.js"(exports, module) {
    "use strict";
    function hasSymbolSupport() {
      return typeof Symbol === "function" && typeof /* @__PURE__ */ Symbol("foo") === "symbol";
    }
    module.exports = hasSymbolSupport;
  }
});

// node_modules/@stdlib/assert-has-symbol-support/lib/index.js
var require_lib7 = __commonJS({
  "node_modules/@stdlib/assert-has-symbol-support/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main6();
    module.exports = main;
  }
});

// node_modules/@stdlib/assert-has-tostringtag-support/lib/main.js
var require_main7 = __commonJS({
  "node_modules/@stdlib/assert-has-tostringtag-support/lib/main.js"(exports, module) {
    "use strict";
    var hasSymbols = require_lib7();
    var FLG = hasSymbols();
    function hasToStringTagSupport() {
      return FLG && typeof Symbol.toStringTag === "symbol";
    }
    module.exports = hasToStringTagSupport;
  }
});

// node_modules/@stdlib/assert-has-tostringtag-support/lib/index.js
var require_lib8 = __commonJS({
  "node_modules/@stdlib/assert-has-tostringtag-support/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main7();
    module.exports = main;
  }
});

// node_modules/@stdlib/utils-native-class/lib/tostring.js
var require_tostring = __commonJS({
  "node_modules/@stdlib/utils-native-class/lib/tostring.js"(exports, module) {
    "use strict";
    var toStr = Object.prototype.toString;
    module.exports = toStr;
  }
});

// node_modules/@stdlib/utils-native-class/lib/main.js
var require_main8 = __commonJS({
  "node_modules/@stdlib/utils-native-class/lib/main.js"(exports, module) {
    "use strict";
    var toStr = require_tostring();
    function nativeClass(v) {
      return toStr.call(v);
    }
    module.exports = nativeClass;
  }
});

// node_modules/@stdlib/assert-has-own-property/lib/main.js
var require_main9 = __commonJS({
  "node_modules/@stdlib/assert-has-own-property/lib/main.js"(exports, module) {
    "use strict";
    var has = Object.prototype.hasOwnProperty;
    function hasOwnProp(value, property) {
      if (value === void 0 || value === null) {
        return false;
      }
      return has.call(value, property);
    }
    module.exports = hasOwnProp;
  }
});

// node_modules/@stdlib/assert-has-own-property/lib/index.js
var require_lib9 = __commonJS({
  "node_modules/@stdlib/assert-has-own-property/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main9();
    module.exports = main;
  }
});

// node_modules/@stdlib/symbol-ctor/lib/main.js
var require_main10 = __commonJS({
  "node_modules/@stdlib/symbol-ctor/lib/main.js"(exports, module) {
    "use strict";
    var Sym = typeof Symbol === "function" ? Symbol : void 0;
    module.exports = Sym;
  }
});

// node_modules/@stdlib/symbol-ctor/lib/index.js
var require_lib10 = __commonJS({
  "node_modules/@stdlib/symbol-ctor/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main10();
    module.exports = main;
  }
});

// node_modules/@stdlib/utils-native-class/lib/tostringtag.js
var require_tostringtag = __commonJS({
  "node_modules/@stdlib/utils-native-class/lib/tostringtag.js"(exports, module) {
    "use strict";
    var Symbol2 = require_lib10();
    var toStrTag = typeof Symbol2 === "function" ? Symbol2.toStringTag : "";
    module.exports = toStrTag;
  }
});

// node_modules/@stdlib/utils-native-class/lib/polyfill.js
var require_polyfill2 = __commonJS({
  "node_modules/@stdlib/utils-native-class/lib/polyfill.js"(exports, module) {
    "use strict";
    var hasOwnProp = require_lib9();
    var toStringTag = require_tostringtag();
    var toStr = require_tostring();
    function nativeClass(v) {
      var isOwn;
      var tag;
      var out;
      if (v === null || v === void 0) {
        return toStr.call(v);
      }
      tag = v[toStringTag];
      isOwn = hasOwnProp(v, toStringTag);
      try {
        v[toStringTag] = void 0;
      } catch (err) {
        return toStr.call(v);
      }
      out = toStr.call(v);
      if (isOwn) {
        v[toStringTag] = tag;
      } else {
        delete v[toStringTag];
      }
      return out;
    }
    module.exports = nativeClass;
  }
});

// node_modules/@stdlib/utils-native-class/lib/index.js
var require_lib11 = __commonJS({
  "node_modules/@stdlib/utils-native-class/lib/index.js"(exports, module) {
    "use strict";
    var hasToStringTag = require_lib8();
    var builtin = require_main8();
    var polyfill = require_polyfill2();
    var main;
    if (hasToStringTag()) {
      main = polyfill;
    } else {
      main = builtin;
    }
    module.exports = main;
  }
});

// node_modules/@stdlib/assert-is-uint32array/lib/main.js
var require_main11 = __commonJS({
  "node_modules/@stdlib/assert-is-uint32array/lib/main.js"(exports, module) {
    "use strict";
    var nativeClass = require_lib11();
    var hasUint32Array = typeof Uint32Array === "function";
    function isUint32Array(value) {
      return hasUint32Array && value instanceof Uint32Array || // eslint-disable-line stdlib/require-globals
      nativeClass(value) === "[object Uint32Array]";
    }
    module.exports = isUint32Array;
  }
});

// node_modules/@stdlib/assert-is-uint32array/lib/index.js
var require_lib12 = __commonJS({
  "node_modules/@stdlib/assert-is-uint32array/lib/index.js"(exports, module) {
    "use strict";
    var isUint32Array = require_main11();
    module.exports = isUint32Array;
  }
});

// node_modules/@stdlib/constants-uint32-max/lib/index.js
var require_lib13 = __commonJS({
  "node_modules/@stdlib/constants-uint32-max/lib/index.js"(exports, module) {
    "use strict";
    var UINT32_MAX = 4294967295;
    module.exports = UINT32_MAX;
  }
});

// node_modules/@stdlib/assert-has-uint32array-support/lib/uint32array.js
var require_uint32array = __commonJS({
  "node_modules/@stdlib/assert-has-uint32array-support/lib/uint32array.js"(exports, module) {
    "use strict";
    var main = typeof Uint32Array === "function" ? Uint32Array : null;
    module.exports = main;
  }
});

// node_modules/@stdlib/assert-has-uint32array-support/lib/main.js
var require_main12 = __commonJS({
  "node_modules/@stdlib/assert-has-uint32array-support/lib/main.js"(exports, module) {
    "use strict";
    var isUint32Array = require_lib12();
    var UINT32_MAX = require_lib13();
    var GlobalUint32Array = require_uint32array();
    function hasUint32ArraySupport() {
      var bool;
      var arr;
      if (typeof GlobalUint32Array !== "function") {
        return false;
      }
      try {
        arr = [1, 3.14, -3.14, UINT32_MAX + 1, UINT32_MAX + 2];
        arr = new GlobalUint32Array(arr);
        bool = isUint32Array(arr) && arr[0] === 1 && arr[1] === 3 && // truncation
        arr[2] === UINT32_MAX - 2 && // truncation and wrap around
        arr[3] === 0 && // wrap around
        arr[4] === 1;
      } catch (err) {
        bool = false;
      }
      return bool;
    }
    module.exports = hasUint32ArraySupport;
  }
});

// node_modules/@stdlib/assert-has-uint32array-support/lib/index.js
var require_lib14 = __commonJS({
  "node_modules/@stdlib/assert-has-uint32array-support/lib/index.js"(exports, module) {
    "use strict";
    var hasUint32ArraySupport = require_main12();
    module.exports = hasUint32ArraySupport;
  }
});

// node_modules/@stdlib/array-uint32/lib/main.js
var require_main13 = __commonJS({
  "node_modules/@stdlib/array-uint32/lib/main.js"(exports, module) {
    "use strict";
    var ctor = typeof Uint32Array === "function" ? Uint32Array : void 0;
    module.exports = ctor;
  }
});

// node_modules/@stdlib/array-uint32/lib/polyfill.js
var require_polyfill3 = __commonJS({
  "node_modules/@stdlib/array-uint32/lib/polyfill.js"(exports, module) {
    "use strict";
    function polyfill() {
      throw new Error("not implemented");
    }
    module.exports = polyfill;
  }
});

// node_modules/@stdlib/array-uint32/lib/index.js
var require_lib15 = __commonJS({
  "node_modules/@stdlib/array-uint32/lib/index.js"(exports, module) {
    "use strict";
    var hasUint32ArraySupport = require_lib14();
    var builtin = require_main13();
    var polyfill = require_polyfill3();
    var ctor;
    if (hasUint32ArraySupport()) {
      ctor = builtin;
    } else {
      ctor = polyfill;
    }
    module.exports = ctor;
  }
});

// node_modules/@stdlib/assert-is-float64array/lib/main.js
var require_main14 = __commonJS({
  "node_modules/@stdlib/assert-is-float64array/lib/main.js"(exports, module) {
    "use strict";
    var nativeClass = require_lib11();
    var hasFloat64Array = typeof Float64Array === "function";
    function isFloat64Array(value) {
      return hasFloat64Array && value instanceof Float64Array || // eslint-disable-line stdlib/require-globals
      nativeClass(value) === "[object Float64Array]";
    }
    module.exports = isFloat64Array;
  }
});

// node_modules/@stdlib/assert-is-float64array/lib/index.js
var require_lib16 = __commonJS({
  "node_modules/@stdlib/assert-is-float64array/lib/index.js"(exports, module) {
    "use strict";
    var isFloat64Array = require_main14();
    module.exports = isFloat64Array;
  }
});

// node_modules/@stdlib/assert-has-float64array-support/lib/float64array.js
var require_float64array = __commonJS({
  "node_modules/@stdlib/assert-has-float64array-support/lib/float64array.js"(exports, module) {
    "use strict";
    var main = typeof Float64Array === "function" ? Float64Array : null;
    module.exports = main;
  }
});

// node_modules/@stdlib/assert-has-float64array-support/lib/main.js
var require_main15 = __commonJS({
  "node_modules/@stdlib/assert-has-float64array-support/lib/main.js"(exports, module) {
    "use strict";
    var isFloat64Array = require_lib16();
    var GlobalFloat64Array = require_float64array();
    function hasFloat64ArraySupport() {
      var bool;
      var arr;
      if (typeof GlobalFloat64Array !== "function") {
        return false;
      }
      try {
        arr = new GlobalFloat64Array([1, 3.14, -3.14, NaN]);
        bool = isFloat64Array(arr) && arr[0] === 1 && arr[1] === 3.14 && arr[2] === -3.14 && arr[3] !== arr[3];
      } catch (err) {
        bool = false;
      }
      return bool;
    }
    module.exports = hasFloat64ArraySupport;
  }
});

// node_modules/@stdlib/assert-has-float64array-support/lib/index.js
var require_lib17 = __commonJS({
  "node_modules/@stdlib/assert-has-float64array-support/lib/index.js"(exports, module) {
    "use strict";
    var hasFloat64ArraySupport = require_main15();
    module.exports = hasFloat64ArraySupport;
  }
});

// node_modules/@stdlib/array-float64/lib/main.js
var require_main16 = __commonJS({
  "node_modules/@stdlib/array-float64/lib/main.js"(exports, module) {
    "use strict";
    var ctor = typeof Float64Array === "function" ? Float64Array : void 0;
    module.exports = ctor;
  }
});

// node_modules/@stdlib/array-float64/lib/polyfill.js
var require_polyfill4 = __commonJS({
  "node_modules/@stdlib/array-float64/lib/polyfill.js"(exports, module) {
    "use strict";
    function polyfill() {
      throw new Error("not implemented");
    }
    module.exports = polyfill;
  }
});

// node_modules/@stdlib/array-float64/lib/index.js
var require_lib18 = __commonJS({
  "node_modules/@stdlib/array-float64/lib/index.js"(exports, module) {
    "use strict";
    var hasFloat64ArraySupport = require_lib17();
    var builtin = require_main16();
    var polyfill = require_polyfill4();
    var ctor;
    if (hasFloat64ArraySupport()) {
      ctor = builtin;
    } else {
      ctor = polyfill;
    }
    module.exports = ctor;
  }
});

// node_modules/@stdlib/assert-is-uint8array/lib/main.js
var require_main17 = __commonJS({
  "node_modules/@stdlib/assert-is-uint8array/lib/main.js"(exports, module) {
    "use strict";
    var nativeClass = require_lib11();
    var hasUint8Array = typeof Uint8Array === "function";
    function isUint8Array(value) {
      return hasUint8Array && value instanceof Uint8Array || // eslint-disable-line stdlib/require-globals
      nativeClass(value) === "[object Uint8Array]";
    }
    module.exports = isUint8Array;
  }
});

// node_modules/@stdlib/assert-is-uint8array/lib/index.js
var require_lib19 = __commonJS({
  "node_modules/@stdlib/assert-is-uint8array/lib/index.js"(exports, module) {
    "use strict";
    var isUint8Array = require_main17();
    module.exports = isUint8Array;
  }
});

// node_modules/@stdlib/constants-uint8-max/lib/index.js
var require_lib20 = __commonJS({
  "node_modules/@stdlib/constants-uint8-max/lib/index.js"(exports, module) {
    "use strict";
    var UINT8_MAX = 255 | 0;
    module.exports = UINT8_MAX;
  }
});

// node_modules/@stdlib/assert-has-uint8array-support/lib/uint8array.js
var require_uint8array = __commonJS({
  "node_modules/@stdlib/assert-has-uint8array-support/lib/uint8array.js"(exports, module) {
    "use strict";
    var main = typeof Uint8Array === "function" ? Uint8Array : null;
    module.exports = main;
  }
});

// node_modules/@stdlib/assert-has-uint8array-support/lib/main.js
var require_main18 = __commonJS({
  "node_modules/@stdlib/assert-has-uint8array-support/lib/main.js"(exports, module) {
    "use strict";
    var isUint8Array = require_lib19();
    var UINT8_MAX = require_lib20();
    var GlobalUint8Array = require_uint8array();
    function hasUint8ArraySupport() {
      var bool;
      var arr;
      if (typeof GlobalUint8Array !== "function") {
        return false;
      }
      try {
        arr = [1, 3.14, -3.14, UINT8_MAX + 1, UINT8_MAX + 2];
        arr = new GlobalUint8Array(arr);
        bool = isUint8Array(arr) && arr[0] === 1 && arr[1] === 3 && // truncation
        arr[2] === UINT8_MAX - 2 && // truncation and wrap around
        arr[3] === 0 && // wrap around
        arr[4] === 1;
      } catch (err) {
        bool = false;
      }
      return bool;
    }
    module.exports = hasUint8ArraySupport;
  }
});

// node_modules/@stdlib/assert-has-uint8array-support/lib/index.js
var require_lib21 = __commonJS({
  "node_modules/@stdlib/assert-has-uint8array-support/lib/index.js"(exports, module) {
    "use strict";
    var hasUint8ArraySupport = require_main18();
    module.exports = hasUint8ArraySupport;
  }
});

// node_modules/@stdlib/array-uint8/lib/main.js
var require_main19 = __commonJS({
  "node_modules/@stdlib/array-uint8/lib/main.js"(exports, module) {
    "use strict";
    var ctor = typeof Uint8Array === "function" ? Uint8Array : void 0;
    module.exports = ctor;
  }
});

// node_modules/@stdlib/array-uint8/lib/polyfill.js
var require_polyfill5 = __commonJS({
  "node_modules/@stdlib/array-uint8/lib/polyfill.js"(exports, module) {
    "use strict";
    function polyfill() {
      throw new Error("not implemented");
    }
    module.exports = polyfill;
  }
});

// node_modules/@stdlib/array-uint8/lib/index.js
var require_lib22 = __commonJS({
  "node_modules/@stdlib/array-uint8/lib/index.js"(exports, module) {
    "use strict";
    var hasUint8ArraySupport = require_lib21();
    var builtin = require_main19();
    var polyfill = require_polyfill5();
    var ctor;
    if (hasUint8ArraySupport()) {
      ctor = builtin;
    } else {
      ctor = polyfill;
    }
    module.exports = ctor;
  }
});

// node_modules/@stdlib/assert-is-uint16array/lib/main.js
var require_main20 = __commonJS({
  "node_modules/@stdlib/assert-is-uint16array/lib/main.js"(exports, module) {
    "use strict";
    var nativeClass = require_lib11();
    var hasUint16Array = typeof Uint16Array === "function";
    function isUint16Array(value) {
      return hasUint16Array && value instanceof Uint16Array || // eslint-disable-line stdlib/require-globals
      nativeClass(value) === "[object Uint16Array]";
    }
    module.exports = isUint16Array;
  }
});

// node_modules/@stdlib/assert-is-uint16array/lib/index.js
var require_lib23 = __commonJS({
  "node_modules/@stdlib/assert-is-uint16array/lib/index.js"(exports, module) {
    "use strict";
    var isUint16Array = require_main20();
    module.exports = isUint16Array;
  }
});

// node_modules/@stdlib/constants-uint16-max/lib/index.js
var require_lib24 = __commonJS({
  "node_modules/@stdlib/constants-uint16-max/lib/index.js"(exports, module) {
    "use strict";
    var UINT16_MAX = 65535 | 0;
    module.exports = UINT16_MAX;
  }
});

// node_modules/@stdlib/assert-has-uint16array-support/lib/uint16array.js
var require_uint16array = __commonJS({
  "node_modules/@stdlib/assert-has-uint16array-support/lib/uint16array.js"(exports, module) {
    "use strict";
    var main = typeof Uint16Array === "function" ? Uint16Array : null;
    module.exports = main;
  }
});

// node_modules/@stdlib/assert-has-uint16array-support/lib/main.js
var require_main21 = __commonJS({
  "node_modules/@stdlib/assert-has-uint16array-support/lib/main.js"(exports, module) {
    "use strict";
    var isUint16Array = require_lib23();
    var UINT16_MAX = require_lib24();
    var GlobalUint16Array = require_uint16array();
    function hasUint16ArraySupport() {
      var bool;
      var arr;
      if (typeof GlobalUint16Array !== "function") {
        return false;
      }
      try {
        arr = [1, 3.14, -3.14, UINT16_MAX + 1, UINT16_MAX + 2];
        arr = new GlobalUint16Array(arr);
        bool = isUint16Array(arr) && arr[0] === 1 && arr[1] === 3 && // truncation
        arr[2] === UINT16_MAX - 2 && // truncation and wrap around
        arr[3] === 0 && // wrap around
        arr[4] === 1;
      } catch (err) {
        bool = false;
      }
      return bool;
    }
    module.exports = hasUint16ArraySupport;
  }
});

// node_modules/@stdlib/assert-has-uint16array-support/lib/index.js
var require_lib25 = __commonJS({
  "node_modules/@stdlib/assert-has-uint16array-support/lib/index.js"(exports, module) {
    "use strict";
    var hasUint16ArraySupport = require_main21();
    module.exports = hasUint16ArraySupport;
  }
});

// node_modules/@stdlib/array-uint16/lib/main.js
var require_main22 = __commonJS({
  "node_modules/@stdlib/array-uint16/lib/main.js"(exports, module) {
    "use strict";
    var ctor = typeof Uint16Array === "function" ? Uint16Array : void 0;
    module.exports = ctor;
  }
});

// node_modules/@stdlib/array-uint16/lib/polyfill.js
var require_polyfill6 = __commonJS({
  "node_modules/@stdlib/array-uint16/lib/polyfill.js"(exports, module) {
    "use strict";
    function polyfill() {
      throw new Error("not implemented");
    }
    module.exports = polyfill;
  }
});

// node_modules/@stdlib/array-uint16/lib/index.js
var require_lib26 = __commonJS({
  "node_modules/@stdlib/array-uint16/lib/index.js"(exports, module) {
    "use strict";
    var hasUint16ArraySupport = require_lib25();
    var builtin = require_main22();
    var polyfill = require_polyfill6();
    var ctor;
    if (hasUint16ArraySupport()) {
      ctor = builtin;
    } else {
      ctor = polyfill;
    }
    module.exports = ctor;
  }
});

// node_modules/@stdlib/assert-is-little-endian/lib/ctors.js
var require_ctors = __commonJS({
  "node_modules/@stdlib/assert-is-little-endian/lib/ctors.js"(exports, module) {
    "use strict";
    var Uint8Array2 = require_lib22();
    var Uint16Array2 = require_lib26();
    var ctors = {
      "uint16": Uint16Array2,
      "uint8": Uint8Array2
    };
    module.exports = ctors;
  }
});

// node_modules/@stdlib/assert-is-little-endian/lib/main.js
var require_main23 = __commonJS({
  "node_modules/@stdlib/assert-is-little-endian/lib/main.js"(exports, module) {
    "use strict";
    var ctors = require_ctors();
    var bool;
    function isLittleEndian() {
      var uint16view;
      var uint8view;
      uint16view = new ctors["uint16"](1);
      uint16view[0] = 4660;
      uint8view = new ctors["uint8"](uint16view.buffer);
      return uint8view[0] === 52;
    }
    bool = isLittleEndian();
    module.exports = bool;
  }
});

// node_modules/@stdlib/assert-is-little-endian/lib/index.js
var require_lib27 = __commonJS({
  "node_modules/@stdlib/assert-is-little-endian/lib/index.js"(exports, module) {
    "use strict";
    var IS_LITTLE_ENDIAN = require_main23();
    module.exports = IS_LITTLE_ENDIAN;
  }
});

// node_modules/@stdlib/number-float64-base-get-high-word/lib/high.js
var require_high = __commonJS({
  "node_modules/@stdlib/number-float64-base-get-high-word/lib/high.js"(exports, module) {
    "use strict";
    var isLittleEndian = require_lib27();
    var HIGH;
    if (isLittleEndian === true) {
      HIGH = 1;
    } else {
      HIGH = 0;
    }
    module.exports = HIGH;
  }
});

// node_modules/@stdlib/number-float64-base-get-high-word/lib/main.js
var require_main24 = __commonJS({
  "node_modules/@stdlib/number-float64-base-get-high-word/lib/main.js"(exports, module) {
    "use strict";
    var Uint32Array2 = require_lib15();
    var Float64Array2 = require_lib18();
    var HIGH = require_high();
    var FLOAT64_VIEW = new Float64Array2(1);
    var UINT32_VIEW = new Uint32Array2(FLOAT64_VIEW.buffer);
    function getHighWord(x) {
      FLOAT64_VIEW[0] = x;
      return UINT32_VIEW[HIGH];
    }
    module.exports = getHighWord;
  }
});

// node_modules/@stdlib/number-float64-base-get-high-word/lib/index.js
var require_lib28 = __commonJS({
  "node_modules/@stdlib/number-float64-base-get-high-word/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main24();
    module.exports = main;
  }
});

// node_modules/@stdlib/number-float64-base-set-high-word/lib/high.js
var require_high2 = __commonJS({
  "node_modules/@stdlib/number-float64-base-set-high-word/lib/high.js"(exports, module) {
    "use strict";
    var isLittleEndian = require_lib27();
    var HIGH;
    if (isLittleEndian === true) {
      HIGH = 1;
    } else {
      HIGH = 0;
    }
    module.exports = HIGH;
  }
});

// node_modules/@stdlib/number-float64-base-set-high-word/lib/main.js
var require_main25 = __commonJS({
  "node_modules/@stdlib/number-float64-base-set-high-word/lib/main.js"(exports, module) {
    "use strict";
    var Uint32Array2 = require_lib15();
    var Float64Array2 = require_lib18();
    var HIGH = require_high2();
    var FLOAT64_VIEW = new Float64Array2(1);
    var UINT32_VIEW = new Uint32Array2(FLOAT64_VIEW.buffer);
    function setHighWord(x, high) {
      FLOAT64_VIEW[0] = x;
      UINT32_VIEW[HIGH] = high >>> 0;
      return FLOAT64_VIEW[0];
    }
    module.exports = setHighWord;
  }
});

// node_modules/@stdlib/number-float64-base-set-high-word/lib/index.js
var require_lib29 = __commonJS({
  "node_modules/@stdlib/number-float64-base-set-high-word/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main25();
    module.exports = main;
  }
});

// node_modules/@stdlib/number-float64-base-from-words/lib/indices.js
var require_indices = __commonJS({
  "node_modules/@stdlib/number-float64-base-from-words/lib/indices.js"(exports, module) {
    "use strict";
    var isLittleEndian = require_lib27();
    var indices;
    var HIGH;
    var LOW;
    if (isLittleEndian === true) {
      HIGH = 1;
      LOW = 0;
    } else {
      HIGH = 0;
      LOW = 1;
    }
    indices = {
      "HIGH": HIGH,
      "LOW": LOW
    };
    module.exports = indices;
  }
});

// node_modules/@stdlib/number-float64-base-from-words/lib/main.js
var require_main26 = __commonJS({
  "node_modules/@stdlib/number-float64-base-from-words/lib/main.js"(exports, module) {
    "use strict";
    var Uint32Array2 = require_lib15();
    var Float64Array2 = require_lib18();
    var indices = require_indices();
    var FLOAT64_VIEW = new Float64Array2(1);
    var UINT32_VIEW = new Uint32Array2(FLOAT64_VIEW.buffer);
    var HIGH = indices.HIGH;
    var LOW = indices.LOW;
    function fromWords(high, low) {
      UINT32_VIEW[HIGH] = high;
      UINT32_VIEW[LOW] = low;
      return FLOAT64_VIEW[0];
    }
    module.exports = fromWords;
  }
});

// node_modules/@stdlib/number-float64-base-from-words/lib/index.js
var require_lib30 = __commonJS({
  "node_modules/@stdlib/number-float64-base-from-words/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main26();
    module.exports = main;
  }
});

// node_modules/@stdlib/constants-float64-pinf/lib/index.js
var require_lib31 = __commonJS({
  "node_modules/@stdlib/constants-float64-pinf/lib/index.js"(exports, module) {
    "use strict";
    var FLOAT64_PINF = Number.POSITIVE_INFINITY;
    module.exports = FLOAT64_PINF;
  }
});

// node_modules/@stdlib/number-ctor/lib/main.js
var require_main27 = __commonJS({
  "node_modules/@stdlib/number-ctor/lib/main.js"(exports, module) {
    "use strict";
    module.exports = Number;
  }
});

// node_modules/@stdlib/number-ctor/lib/index.js
var require_lib32 = __commonJS({
  "node_modules/@stdlib/number-ctor/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main27();
    module.exports = main;
  }
});

// node_modules/@stdlib/constants-float64-ninf/lib/index.js
var require_lib33 = __commonJS({
  "node_modules/@stdlib/constants-float64-ninf/lib/index.js"(exports, module) {
    "use strict";
    var Number2 = require_lib32();
    var FLOAT64_NINF = Number2.NEGATIVE_INFINITY;
    module.exports = FLOAT64_NINF;
  }
});

// node_modules/@stdlib/constants-float64-exponent-bias/lib/index.js
var require_lib34 = __commonJS({
  "node_modules/@stdlib/constants-float64-exponent-bias/lib/index.js"(exports, module) {
    "use strict";
    var FLOAT64_EXPONENT_BIAS = 1023 | 0;
    module.exports = FLOAT64_EXPONENT_BIAS;
  }
});

// node_modules/@stdlib/constants-float64-half-ln-two/lib/index.js
var require_lib35 = __commonJS({
  "node_modules/@stdlib/constants-float64-half-ln-two/lib/index.js"(exports, module) {
    "use strict";
    var HALF_LN2 = 0.34657359027997264;
    module.exports = HALF_LN2;
  }
});

// node_modules/@stdlib/math-base-special-expm1/lib/polyval_q.js
var require_polyval_q = __commonJS({
  "node_modules/@stdlib/math-base-special-expm1/lib/polyval_q.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return -0.03333333333333313;
      }
      return -0.03333333333333313 + x * (0.0015873015872548146 + x * (-793650757867488e-19 + x * (4008217827329362e-21 + x * -20109921818362437e-23)));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-expm1/lib/main.js
var require_main28 = __commonJS({
  "node_modules/@stdlib/math-base-special-expm1/lib/main.js"(exports, module) {
    "use strict";
    var isnan = require_lib6();
    var getHighWord = require_lib28();
    var setHighWord = require_lib29();
    var fromWords = require_lib30();
    var PINF = require_lib31();
    var NINF = require_lib33();
    var FLOAT64_EXPONENT_BIAS = require_lib34();
    var HALF_LN2 = require_lib35();
    var polyval = require_polyval_q();
    var OVERFLOW_THRESHOLD = 709.782712893384;
    var LN2_HI = 0.6931471803691238;
    var LN2_LO = 19082149292705877e-26;
    var LN2_INV = 1.4426950408889634;
    var LN2x56 = 38.816242111356935;
    var LN2_HALFX3 = 1.0397207708399179;
    function expm1(x) {
      var halfX;
      var twopk;
      var sign;
      var hi;
      var lo;
      var hx;
      var r1;
      var y;
      var z;
      var c;
      var t;
      var e;
      var k;
      if (x === PINF || isnan(x)) {
        return x;
      }
      if (x === NINF) {
        return -1;
      }
      if (x === 0) {
        return x;
      }
      if (x < 0) {
        sign = true;
        y = -x;
      } else {
        sign = false;
        y = x;
      }
      if (y >= LN2x56) {
        if (sign) {
          return -1;
        }
        if (y >= OVERFLOW_THRESHOLD) {
          return PINF;
        }
      }
      hx = getHighWord(y) | 0;
      if (y > HALF_LN2) {
        if (y < LN2_HALFX3) {
          if (sign) {
            hi = x + LN2_HI;
            lo = -LN2_LO;
            k = -1;
          } else {
            hi = x - LN2_HI;
            lo = LN2_LO;
            k = 1;
          }
        } else {
          if (sign) {
            k = LN2_INV * x - 0.5;
          } else {
            k = LN2_INV * x + 0.5;
          }
          k |= 0;
          t = k;
          hi = x - t * LN2_HI;
          lo = t * LN2_LO;
        }
        x = hi - lo;
        c = hi - x - lo;
      } else if (hx < 1016070144) {
        return x;
      } else {
        k = 0;
      }
      halfX = 0.5 * x;
      z = x * halfX;
      r1 = 1 + z * polyval(z);
      t = 3 - r1 * halfX;
      e = z * ((r1 - t) / (6 - x * t));
      if (k === 0) {
        return x - (x * e - z);
      }
      twopk = fromWords(FLOAT64_EXPONENT_BIAS + k << 20, 0);
      e = x * (e - c) - c;
      e -= z;
      if (k === -1) {
        return 0.5 * (x - e) - 0.5;
      }
      if (k === 1) {
        if (x < -0.25) {
          return -2 * (e - (x + 0.5));
        }
        return 1 + 2 * (x - e);
      }
      if (k <= -2 || k > 56) {
        y = 1 - (e - x);
        if (k === 1024) {
          hi = getHighWord(y) + (k << 20) | 0;
          y = setHighWord(y, hi);
        } else {
          y *= twopk;
        }
        return y - 1;
      }
      t = 1;
      if (k < 20) {
        hi = 1072693248 - (2097152 >> k) | 0;
        t = setHighWord(t, hi);
        y = t - (e - x);
      } else {
        hi = FLOAT64_EXPONENT_BIAS - k << 20 | 0;
        t = setHighWord(t, hi);
        y = x - (e + t);
        y += 1;
      }
      y *= twopk;
      return y;
    }
    module.exports = expm1;
  }
});

// node_modules/@stdlib/math-base-special-expm1/lib/index.js
var require_lib36 = __commonJS({
  "node_modules/@stdlib/math-base-special-expm1/lib/index.js"(exports, module) {
    "use strict";
    var expm1 = require_main28();
    module.exports = expm1;
  }
});

// node_modules/@stdlib/math-base-special-floor/lib/main.js
var require_main29 = __commonJS({
  "node_modules/@stdlib/math-base-special-floor/lib/main.js"(exports, module) {
    "use strict";
    var floor = Math.floor;
    module.exports = floor;
  }
});

// node_modules/@stdlib/math-base-special-floor/lib/index.js
var require_lib37 = __commonJS({
  "node_modules/@stdlib/math-base-special-floor/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main29();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-special-log1p/lib/polyval_lp.js
var require_polyval_lp = __commonJS({
  "node_modules/@stdlib/math-base-special-log1p/lib/polyval_lp.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return 0.6666666666666735;
      }
      return 0.6666666666666735 + x * (0.3999999999940942 + x * (0.2857142874366239 + x * (0.22222198432149784 + x * (0.1818357216161805 + x * (0.15313837699209373 + x * 0.14798198605116586)))));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-log1p/lib/main.js
var require_main30 = __commonJS({
  "node_modules/@stdlib/math-base-special-log1p/lib/main.js"(exports, module) {
    "use strict";
    var isnan = require_lib6();
    var getHighWord = require_lib28();
    var setHighWord = require_lib29();
    var PINF = require_lib31();
    var NINF = require_lib33();
    var FLOAT64_EXPONENT_BIAS = require_lib34();
    var polyval = require_polyval_lp();
    var LN2_HI = 0.6931471803691238;
    var LN2_LO = 19082149292705877e-26;
    var SQRT2M1 = 0.41421356237309503;
    var SQRT2HALFM1 = -0.2928932188134525;
    var SMALL = 1862645149230957e-24;
    var TINY = 5551115123125783e-32;
    var TWO53 = 9007199254740992;
    var TWO_THIRDS = 0.6666666666666666;
    function log1p(x) {
      var hfsq;
      var hu;
      var y;
      var f;
      var c;
      var s;
      var z;
      var R;
      var u;
      var k;
      if (x < -1 || isnan(x)) {
        return NaN;
      }
      if (x === -1) {
        return NINF;
      }
      if (x === PINF) {
        return x;
      }
      if (x === 0) {
        return x;
      }
      if (x < 0) {
        y = -x;
      } else {
        y = x;
      }
      k = 1;
      if (y < SQRT2M1) {
        if (y < SMALL) {
          if (y < TINY) {
            return x;
          }
          return x - x * x * 0.5;
        }
        if (x > SQRT2HALFM1) {
          k = 0;
          f = x;
          hu = 1;
        }
      }
      if (k !== 0) {
        if (y < TWO53) {
          u = 1 + x;
          hu = getHighWord(u);
          k = (hu >> 20) - FLOAT64_EXPONENT_BIAS;
          if (k > 0) {
            c = 1 - (u - x);
          } else {
            c = x - (u - 1);
          }
          c /= u;
        } else {
          u = x;
          hu = getHighWord(u);
          k = (hu >> 20) - FLOAT64_EXPONENT_BIAS;
          c = 0;
        }
        hu &= 1048575;
        if (hu < 434334) {
          u = setHighWord(u, hu | 1072693248);
        } else {
          k += 1;
          u = setHighWord(u, hu | 1071644672);
          hu = 1048576 - hu >> 2;
        }
        f = u - 1;
      }
      hfsq = 0.5 * f * f;
      if (hu === 0) {
        if (f === 0) {
          c += k * LN2_LO;
          return k * LN2_HI + c;
        }
        R = hfsq * (1 - TWO_THIRDS * f);
        return k * LN2_HI - (R - (k * LN2_LO + c) - f);
      }
      s = f / (2 + f);
      z = s * s;
      R = z * polyval(z);
      if (k === 0) {
        return f - (hfsq - s * (hfsq + R));
      }
      return k * LN2_HI - (hfsq - (s * (hfsq + R) + (k * LN2_LO + c)) - f);
    }
    module.exports = log1p;
  }
});

// node_modules/@stdlib/math-base-special-log1p/lib/index.js
var require_lib38 = __commonJS({
  "node_modules/@stdlib/math-base-special-log1p/lib/index.js"(exports, module) {
    "use strict";
    var log1p = require_main30();
    module.exports = log1p;
  }
});

// node_modules/@stdlib/math-base-special-sqrt/lib/main.js
var require_main31 = __commonJS({
  "node_modules/@stdlib/math-base-special-sqrt/lib/main.js"(exports, module) {
    "use strict";
    var sqrt = Math.sqrt;
    module.exports = sqrt;
  }
});

// node_modules/@stdlib/math-base-special-sqrt/lib/index.js
var require_lib39 = __commonJS({
  "node_modules/@stdlib/math-base-special-sqrt/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main31();
    module.exports = main;
  }
});

// node_modules/@stdlib/constants-float64-fourth-pi/lib/index.js
var require_lib40 = __commonJS({
  "node_modules/@stdlib/constants-float64-fourth-pi/lib/index.js"(exports, module) {
    "use strict";
    var FOURTH_PI = 0.7853981633974483;
    module.exports = FOURTH_PI;
  }
});

// node_modules/@stdlib/math-base-special-asin/lib/rational_pq.js
var require_rational_pq = __commonJS({
  "node_modules/@stdlib/math-base-special-asin/lib/rational_pq.js"(exports, module) {
    "use strict";
    function evalrational(x) {
      var ax;
      var s1;
      var s2;
      if (x === 0) {
        return 0.16666666666666713;
      }
      if (x < 0) {
        ax = -x;
      } else {
        ax = x;
      }
      if (ax <= 1) {
        s1 = -8.198089802484825 + x * (19.562619833175948 + x * (-16.262479672107002 + x * (5.444622390564711 + x * (-0.6019598008014124 + x * 0.004253011369004428))));
        s2 = -49.18853881490881 + x * (139.51056146574857 + x * (-147.1791292232726 + x * (70.49610280856842 + x * (-14.740913729888538 + x * 1))));
      } else {
        x = 1 / x;
        s1 = 0.004253011369004428 + x * (-0.6019598008014124 + x * (5.444622390564711 + x * (-16.262479672107002 + x * (19.562619833175948 + x * -8.198089802484825))));
        s2 = 1 + x * (-14.740913729888538 + x * (70.49610280856842 + x * (-147.1791292232726 + x * (139.51056146574857 + x * -49.18853881490881))));
      }
      return s1 / s2;
    }
    module.exports = evalrational;
  }
});

// node_modules/@stdlib/math-base-special-asin/lib/rational_rs.js
var require_rational_rs = __commonJS({
  "node_modules/@stdlib/math-base-special-asin/lib/rational_rs.js"(exports, module) {
    "use strict";
    function evalrational(x) {
      var ax;
      var s1;
      var s2;
      if (x === 0) {
        return 0.08333333333333809;
      }
      if (x < 0) {
        ax = -x;
      } else {
        ax = x;
      }
      if (ax <= 1) {
        s1 = 28.536655482610616 + x * (-25.56901049652825 + x * (6.968710824104713 + x * (-0.5634242780008963 + x * 0.002967721961301243)));
        s2 = 342.43986579130785 + x * (-383.8770957603691 + x * (147.0656354026815 + x * (-21.947795316429207 + x * 1)));
      } else {
        x = 1 / x;
        s1 = 0.002967721961301243 + x * (-0.5634242780008963 + x * (6.968710824104713 + x * (-25.56901049652825 + x * 28.536655482610616)));
        s2 = 1 + x * (-21.947795316429207 + x * (147.0656354026815 + x * (-383.8770957603691 + x * 342.43986579130785)));
      }
      return s1 / s2;
    }
    module.exports = evalrational;
  }
});

// node_modules/@stdlib/math-base-special-asin/lib/main.js
var require_main32 = __commonJS({
  "node_modules/@stdlib/math-base-special-asin/lib/main.js"(exports, module) {
    "use strict";
    var isnan = require_lib6();
    var sqrt = require_lib39();
    var PIO4 = require_lib40();
    var ratevalPQ = require_rational_pq();
    var ratevalRS = require_rational_rs();
    var MOREBITS = 6123233995736766e-32;
    function asin(x) {
      var sgn;
      var zz;
      var a;
      var p;
      var z;
      if (isnan(x)) {
        return NaN;
      }
      if (x > 0) {
        a = x;
      } else {
        sgn = true;
        a = -x;
      }
      if (a > 1) {
        return NaN;
      }
      if (a > 0.625) {
        zz = 1 - a;
        p = zz * ratevalRS(zz);
        zz = sqrt(zz + zz);
        z = PIO4 - zz;
        zz = zz * p - MOREBITS;
        z -= zz;
        z += PIO4;
      } else {
        if (a < 1e-8) {
          return x;
        }
        zz = a * a;
        z = zz * ratevalPQ(zz);
        z = a * z + a;
      }
      return sgn ? -z : z;
    }
    module.exports = asin;
  }
});

// node_modules/@stdlib/math-base-special-asin/lib/index.js
var require_lib41 = __commonJS({
  "node_modules/@stdlib/math-base-special-asin/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main32();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-special-abs/lib/main.js
var require_main33 = __commonJS({
  "node_modules/@stdlib/math-base-special-abs/lib/main.js"(exports, module) {
    "use strict";
    function abs(x) {
      return Math.abs(x);
    }
    module.exports = abs;
  }
});

// node_modules/@stdlib/math-base-special-abs/lib/index.js
var require_lib42 = __commonJS({
  "node_modules/@stdlib/math-base-special-abs/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main33();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-special-ceil/lib/main.js
var require_main34 = __commonJS({
  "node_modules/@stdlib/math-base-special-ceil/lib/main.js"(exports, module) {
    "use strict";
    var ceil = Math.ceil;
    module.exports = ceil;
  }
});

// node_modules/@stdlib/math-base-special-ceil/lib/index.js
var require_lib43 = __commonJS({
  "node_modules/@stdlib/math-base-special-ceil/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main34();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-special-trunc/lib/main.js
var require_main35 = __commonJS({
  "node_modules/@stdlib/math-base-special-trunc/lib/main.js"(exports, module) {
    "use strict";
    var floor = require_lib37();
    var ceil = require_lib43();
    function trunc(x) {
      if (x < 0) {
        return ceil(x);
      }
      return floor(x);
    }
    module.exports = trunc;
  }
});

// node_modules/@stdlib/math-base-special-trunc/lib/index.js
var require_lib44 = __commonJS({
  "node_modules/@stdlib/math-base-special-trunc/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main35();
    module.exports = main;
  }
});

// node_modules/@stdlib/constants-float64-max-base2-exponent/lib/index.js
var require_lib45 = __commonJS({
  "node_modules/@stdlib/constants-float64-max-base2-exponent/lib/index.js"(exports, module) {
    "use strict";
    var FLOAT64_MAX_BASE2_EXPONENT = 1023 | 0;
    module.exports = FLOAT64_MAX_BASE2_EXPONENT;
  }
});

// node_modules/@stdlib/constants-float64-max-base2-exponent-subnormal/lib/index.js
var require_lib46 = __commonJS({
  "node_modules/@stdlib/constants-float64-max-base2-exponent-subnormal/lib/index.js"(exports, module) {
    "use strict";
    var FLOAT64_MAX_BASE2_EXPONENT_SUBNORMAL = -1023 | 0;
    module.exports = FLOAT64_MAX_BASE2_EXPONENT_SUBNORMAL;
  }
});

// node_modules/@stdlib/constants-float64-min-base2-exponent-subnormal/lib/index.js
var require_lib47 = __commonJS({
  "node_modules/@stdlib/constants-float64-min-base2-exponent-subnormal/lib/index.js"(exports, module) {
    "use strict";
    var FLOAT64_MIN_BASE2_EXPONENT_SUBNORMAL = -1074 | 0;
    module.exports = FLOAT64_MIN_BASE2_EXPONENT_SUBNORMAL;
  }
});

// node_modules/@stdlib/math-base-assert-is-infinite/lib/main.js
var require_main36 = __commonJS({
  "node_modules/@stdlib/math-base-assert-is-infinite/lib/main.js"(exports, module) {
    "use strict";
    var PINF = require_lib31();
    var NINF = require_lib33();
    function isInfinite(x) {
      return x === PINF || x === NINF;
    }
    module.exports = isInfinite;
  }
});

// node_modules/@stdlib/math-base-assert-is-infinite/lib/index.js
var require_lib48 = __commonJS({
  "node_modules/@stdlib/math-base-assert-is-infinite/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main36();
    module.exports = main;
  }
});

// node_modules/@stdlib/constants-float64-high-word-sign-mask/lib/index.js
var require_lib49 = __commonJS({
  "node_modules/@stdlib/constants-float64-high-word-sign-mask/lib/index.js"(exports, module) {
    "use strict";
    var FLOAT64_HIGH_WORD_SIGN_MASK = 2147483648 >>> 0;
    module.exports = FLOAT64_HIGH_WORD_SIGN_MASK;
  }
});

// node_modules/@stdlib/constants-float64-high-word-abs-mask/lib/index.js
var require_lib50 = __commonJS({
  "node_modules/@stdlib/constants-float64-high-word-abs-mask/lib/index.js"(exports, module) {
    "use strict";
    var FLOAT64_HIGH_WORD_ABS_MASK = 2147483647 >>> 0;
    module.exports = FLOAT64_HIGH_WORD_ABS_MASK;
  }
});

// node_modules/@stdlib/number-float64-base-to-words/lib/indices.js
var require_indices2 = __commonJS({
  "node_modules/@stdlib/number-float64-base-to-words/lib/indices.js"(exports, module) {
    "use strict";
    var isLittleEndian = require_lib27();
    var indices;
    var HIGH;
    var LOW;
    if (isLittleEndian === true) {
      HIGH = 1;
      LOW = 0;
    } else {
      HIGH = 0;
      LOW = 1;
    }
    indices = {
      "HIGH": HIGH,
      "LOW": LOW
    };
    module.exports = indices;
  }
});

// node_modules/@stdlib/number-float64-base-to-words/lib/assign.js
var require_assign = __commonJS({
  "node_modules/@stdlib/number-float64-base-to-words/lib/assign.js"(exports, module) {
    "use strict";
    var Uint32Array2 = require_lib15();
    var Float64Array2 = require_lib18();
    var indices = require_indices2();
    var FLOAT64_VIEW = new Float64Array2(1);
    var UINT32_VIEW = new Uint32Array2(FLOAT64_VIEW.buffer);
    var HIGH = indices.HIGH;
    var LOW = indices.LOW;
    function toWords(x, out, stride, offset) {
      FLOAT64_VIEW[0] = x;
      out[offset] = UINT32_VIEW[HIGH];
      out[offset + stride] = UINT32_VIEW[LOW];
      return out;
    }
    module.exports = toWords;
  }
});

// node_modules/@stdlib/number-float64-base-to-words/lib/main.js
var require_main37 = __commonJS({
  "node_modules/@stdlib/number-float64-base-to-words/lib/main.js"(exports, module) {
    "use strict";
    var fcn = require_assign();
    function toWords(x) {
      return fcn(x, [0 >>> 0, 0 >>> 0], 1, 0);
    }
    module.exports = toWords;
  }
});

// node_modules/@stdlib/number-float64-base-to-words/lib/index.js
var require_lib51 = __commonJS({
  "node_modules/@stdlib/number-float64-base-to-words/lib/index.js"(exports, module) {
    "use strict";
    var setReadOnly = require_lib5();
    var main = require_main37();
    var assign = require_assign();
    setReadOnly(main, "assign", assign);
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-special-copysign/lib/main.js
var require_main38 = __commonJS({
  "node_modules/@stdlib/math-base-special-copysign/lib/main.js"(exports, module) {
    "use strict";
    var SIGN_MASK = require_lib49();
    var ABS_MASK = require_lib50();
    var toWords = require_lib51();
    var getHighWord = require_lib28();
    var fromWords = require_lib30();
    var WORDS = [0, 0];
    function copysign(x, y) {
      var hx;
      var hy;
      toWords.assign(x, WORDS, 1, 0);
      hx = WORDS[0];
      hx &= ABS_MASK;
      hy = getHighWord(y);
      hy &= SIGN_MASK;
      hx |= hy;
      return fromWords(hx, WORDS[1]);
    }
    module.exports = copysign;
  }
});

// node_modules/@stdlib/math-base-special-copysign/lib/index.js
var require_lib52 = __commonJS({
  "node_modules/@stdlib/math-base-special-copysign/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main38();
    module.exports = main;
  }
});

// node_modules/@stdlib/constants-float64-smallest-normal/lib/index.js
var require_lib53 = __commonJS({
  "node_modules/@stdlib/constants-float64-smallest-normal/lib/index.js"(exports, module) {
    "use strict";
    var FLOAT64_SMALLEST_NORMAL = 22250738585072014e-324;
    module.exports = FLOAT64_SMALLEST_NORMAL;
  }
});

// node_modules/@stdlib/number-float64-base-normalize/lib/assign.js
var require_assign2 = __commonJS({
  "node_modules/@stdlib/number-float64-base-normalize/lib/assign.js"(exports, module) {
    "use strict";
    var FLOAT64_SMALLEST_NORMAL = require_lib53();
    var isInfinite = require_lib48();
    var isnan = require_lib6();
    var abs = require_lib42();
    var SCALAR = 4503599627370496;
    function normalize(x, out, stride, offset) {
      if (isnan(x) || isInfinite(x)) {
        out[offset] = x;
        out[offset + stride] = 0;
        return out;
      }
      if (x !== 0 && abs(x) < FLOAT64_SMALLEST_NORMAL) {
        out[offset] = x * SCALAR;
        out[offset + stride] = -52;
        return out;
      }
      out[offset] = x;
      out[offset + stride] = 0;
      return out;
    }
    module.exports = normalize;
  }
});

// node_modules/@stdlib/number-float64-base-normalize/lib/main.js
var require_main39 = __commonJS({
  "node_modules/@stdlib/number-float64-base-normalize/lib/main.js"(exports, module) {
    "use strict";
    var fcn = require_assign2();
    function normalize(x) {
      return fcn(x, [0, 0], 1, 0);
    }
    module.exports = normalize;
  }
});

// node_modules/@stdlib/number-float64-base-normalize/lib/index.js
var require_lib54 = __commonJS({
  "node_modules/@stdlib/number-float64-base-normalize/lib/index.js"(exports, module) {
    "use strict";
    var setReadOnly = require_lib5();
    var main = require_main39();
    var assign = require_assign2();
    setReadOnly(main, "assign", assign);
    module.exports = main;
  }
});

// node_modules/@stdlib/constants-float64-high-word-exponent-mask/lib/index.js
var require_lib55 = __commonJS({
  "node_modules/@stdlib/constants-float64-high-word-exponent-mask/lib/index.js"(exports, module) {
    "use strict";
    var FLOAT64_HIGH_WORD_EXPONENT_MASK = 2146435072;
    module.exports = FLOAT64_HIGH_WORD_EXPONENT_MASK;
  }
});

// node_modules/@stdlib/number-float64-base-exponent/lib/main.js
var require_main40 = __commonJS({
  "node_modules/@stdlib/number-float64-base-exponent/lib/main.js"(exports, module) {
    "use strict";
    var getHighWord = require_lib28();
    var EXP_MASK = require_lib55();
    var BIAS = require_lib34();
    function exponent(x) {
      var high = getHighWord(x);
      high = (high & EXP_MASK) >>> 20;
      return high - BIAS | 0;
    }
    module.exports = exponent;
  }
});

// node_modules/@stdlib/number-float64-base-exponent/lib/index.js
var require_lib56 = __commonJS({
  "node_modules/@stdlib/number-float64-base-exponent/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main40();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-special-ldexp/lib/main.js
var require_main41 = __commonJS({
  "node_modules/@stdlib/math-base-special-ldexp/lib/main.js"(exports, module) {
    "use strict";
    var PINF = require_lib31();
    var NINF = require_lib33();
    var BIAS = require_lib34();
    var MAX_EXPONENT = require_lib45();
    var MAX_SUBNORMAL_EXPONENT = require_lib46();
    var MIN_SUBNORMAL_EXPONENT = require_lib47();
    var isnan = require_lib6();
    var isInfinite = require_lib48();
    var copysign = require_lib52();
    var normalize = require_lib54().assign;
    var floatExp = require_lib56();
    var toWords = require_lib51();
    var fromWords = require_lib30();
    var TWO52_INV = 2220446049250313e-31;
    var CLEAR_EXP_MASK = 2148532223 >>> 0;
    var FRAC = [0, 0];
    var WORDS = [0, 0];
    function ldexp(frac, exp9) {
      var high;
      var m;
      if (exp9 === 0 || frac === 0 || // handles +-0
      isnan(frac) || isInfinite(frac)) {
        return frac;
      }
      normalize(frac, FRAC, 1, 0);
      frac = FRAC[0];
      exp9 += FRAC[1];
      exp9 += floatExp(frac);
      if (exp9 < MIN_SUBNORMAL_EXPONENT) {
        return copysign(0, frac);
      }
      if (exp9 > MAX_EXPONENT) {
        if (frac < 0) {
          return NINF;
        }
        return PINF;
      }
      if (exp9 <= MAX_SUBNORMAL_EXPONENT) {
        exp9 += 52;
        m = TWO52_INV;
      } else {
        m = 1;
      }
      toWords.assign(frac, WORDS, 1, 0);
      high = WORDS[0];
      high &= CLEAR_EXP_MASK;
      high |= exp9 + BIAS << 20;
      return m * fromWords(high, WORDS[1]);
    }
    module.exports = ldexp;
  }
});

// node_modules/@stdlib/math-base-special-ldexp/lib/index.js
var require_lib57 = __commonJS({
  "node_modules/@stdlib/math-base-special-ldexp/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main41();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-special-exp/lib/polyval_p.js
var require_polyval_p = __commonJS({
  "node_modules/@stdlib/math-base-special-exp/lib/polyval_p.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return 0.16666666666666602;
      }
      return 0.16666666666666602 + x * (-0.0027777777777015593 + x * (6613756321437934e-20 + x * (-16533902205465252e-22 + x * 41381367970572385e-24)));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-exp/lib/expmulti.js
var require_expmulti = __commonJS({
  "node_modules/@stdlib/math-base-special-exp/lib/expmulti.js"(exports, module) {
    "use strict";
    var ldexp = require_lib57();
    var polyvalP = require_polyval_p();
    function expmulti(hi, lo, k) {
      var r;
      var t;
      var c;
      var y;
      r = hi - lo;
      t = r * r;
      c = r - t * polyvalP(t);
      y = 1 - (lo - r * c / (2 - c) - hi);
      return ldexp(y, k);
    }
    module.exports = expmulti;
  }
});

// node_modules/@stdlib/math-base-special-exp/lib/main.js
var require_main42 = __commonJS({
  "node_modules/@stdlib/math-base-special-exp/lib/main.js"(exports, module) {
    "use strict";
    var isnan = require_lib6();
    var trunc = require_lib44();
    var NINF = require_lib33();
    var PINF = require_lib31();
    var expmulti = require_expmulti();
    var LN2_HI = 0.6931471803691238;
    var LN2_LO = 19082149292705877e-26;
    var LOG2_E = 1.4426950408889634;
    var OVERFLOW = 709.782712893384;
    var UNDERFLOW = -745.1332191019411;
    var NEARZERO = 1 / (1 << 28);
    var NEG_NEARZERO = -NEARZERO;
    function exp9(x) {
      var hi;
      var lo;
      var k;
      if (isnan(x) || x === PINF) {
        return x;
      }
      if (x === NINF) {
        return 0;
      }
      if (x > OVERFLOW) {
        return PINF;
      }
      if (x < UNDERFLOW) {
        return 0;
      }
      if (x > NEG_NEARZERO && x < NEARZERO) {
        return 1 + x;
      }
      if (x < 0) {
        k = trunc(LOG2_E * x - 0.5);
      } else {
        k = trunc(LOG2_E * x + 0.5);
      }
      hi = x - k * LN2_HI;
      lo = k * LN2_LO;
      return expmulti(hi, lo, k);
    }
    module.exports = exp9;
  }
});

// node_modules/@stdlib/math-base-special-exp/lib/index.js
var require_lib58 = __commonJS({
  "node_modules/@stdlib/math-base-special-exp/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main42();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-assert-is-integer/lib/main.js
var require_main43 = __commonJS({
  "node_modules/@stdlib/math-base-assert-is-integer/lib/main.js"(exports, module) {
    "use strict";
    var floor = require_lib37();
    function isInteger(x) {
      return floor(x) === x;
    }
    module.exports = isInteger;
  }
});

// node_modules/@stdlib/math-base-assert-is-integer/lib/index.js
var require_lib59 = __commonJS({
  "node_modules/@stdlib/math-base-assert-is-integer/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main43();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-assert-is-even/lib/main.js
var require_main44 = __commonJS({
  "node_modules/@stdlib/math-base-assert-is-even/lib/main.js"(exports, module) {
    "use strict";
    var isInteger = require_lib59();
    function isEven(x) {
      return isInteger(x / 2);
    }
    module.exports = isEven;
  }
});

// node_modules/@stdlib/math-base-assert-is-even/lib/index.js
var require_lib60 = __commonJS({
  "node_modules/@stdlib/math-base-assert-is-even/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main44();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-assert-is-odd/lib/main.js
var require_main45 = __commonJS({
  "node_modules/@stdlib/math-base-assert-is-odd/lib/main.js"(exports, module) {
    "use strict";
    var isEven = require_lib60();
    function isOdd(x) {
      if (x > 0) {
        return isEven(x - 1);
      }
      return isEven(x + 1);
    }
    module.exports = isOdd;
  }
});

// node_modules/@stdlib/math-base-assert-is-odd/lib/index.js
var require_lib61 = __commonJS({
  "node_modules/@stdlib/math-base-assert-is-odd/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main45();
    module.exports = main;
  }
});

// node_modules/@stdlib/number-float64-base-set-low-word/lib/low.js
var require_low = __commonJS({
  "node_modules/@stdlib/number-float64-base-set-low-word/lib/low.js"(exports, module) {
    "use strict";
    var isLittleEndian = require_lib27();
    var LOW;
    if (isLittleEndian === true) {
      LOW = 0;
    } else {
      LOW = 1;
    }
    module.exports = LOW;
  }
});

// node_modules/@stdlib/number-float64-base-set-low-word/lib/main.js
var require_main46 = __commonJS({
  "node_modules/@stdlib/number-float64-base-set-low-word/lib/main.js"(exports, module) {
    "use strict";
    var Uint32Array2 = require_lib15();
    var Float64Array2 = require_lib18();
    var LOW = require_low();
    var FLOAT64_VIEW = new Float64Array2(1);
    var UINT32_VIEW = new Uint32Array2(FLOAT64_VIEW.buffer);
    function setLowWord(x, low) {
      FLOAT64_VIEW[0] = x;
      UINT32_VIEW[LOW] = low >>> 0;
      return FLOAT64_VIEW[0];
    }
    module.exports = setLowWord;
  }
});

// node_modules/@stdlib/number-float64-base-set-low-word/lib/index.js
var require_lib62 = __commonJS({
  "node_modules/@stdlib/number-float64-base-set-low-word/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main46();
    module.exports = main;
  }
});

// node_modules/@stdlib/number-uint32-base-to-int32/lib/main.js
var require_main47 = __commonJS({
  "node_modules/@stdlib/number-uint32-base-to-int32/lib/main.js"(exports, module) {
    "use strict";
    function uint32ToInt32(x) {
      return x | 0;
    }
    module.exports = uint32ToInt32;
  }
});

// node_modules/@stdlib/number-uint32-base-to-int32/lib/index.js
var require_lib63 = __commonJS({
  "node_modules/@stdlib/number-uint32-base-to-int32/lib/index.js"(exports, module) {
    "use strict";
    var uint32ToInt32 = require_main47();
    module.exports = uint32ToInt32;
  }
});

// node_modules/@stdlib/math-base-special-pow/lib/x_is_zero.js
var require_x_is_zero = __commonJS({
  "node_modules/@stdlib/math-base-special-pow/lib/x_is_zero.js"(exports, module) {
    "use strict";
    var isOdd = require_lib61();
    var copysign = require_lib52();
    var NINF = require_lib33();
    var PINF = require_lib31();
    function pow(x, y) {
      if (y === NINF) {
        return PINF;
      }
      if (y === PINF) {
        return 0;
      }
      if (y > 0) {
        if (isOdd(y)) {
          return x;
        }
        return 0;
      }
      if (isOdd(y)) {
        return copysign(PINF, x);
      }
      return PINF;
    }
    module.exports = pow;
  }
});

// node_modules/@stdlib/math-base-special-pow/lib/y_is_huge.js
var require_y_is_huge = __commonJS({
  "node_modules/@stdlib/math-base-special-pow/lib/y_is_huge.js"(exports, module) {
    "use strict";
    var ABS_MASK = require_lib50();
    var getHighWord = require_lib28();
    var HIGH_MAX_NEAR_UNITY = 1072693247 | 0;
    var HUGE = 1e300;
    var TINY = 1e-300;
    function pow(x, y) {
      var ahx;
      var hx;
      hx = getHighWord(x);
      ahx = hx & ABS_MASK;
      if (ahx <= HIGH_MAX_NEAR_UNITY) {
        if (y < 0) {
          return HUGE * HUGE;
        }
        return TINY * TINY;
      }
      if (y > 0) {
        return HUGE * HUGE;
      }
      return TINY * TINY;
    }
    module.exports = pow;
  }
});

// node_modules/@stdlib/math-base-special-pow/lib/y_is_infinite.js
var require_y_is_infinite = __commonJS({
  "node_modules/@stdlib/math-base-special-pow/lib/y_is_infinite.js"(exports, module) {
    "use strict";
    var abs = require_lib42();
    var PINF = require_lib31();
    function pow(x, y) {
      if (x === -1) {
        return (x - x) / (x - x);
      }
      if (x === 1) {
        return 1;
      }
      if (abs(x) < 1 === (y === PINF)) {
        return 0;
      }
      return PINF;
    }
    module.exports = pow;
  }
});

// node_modules/@stdlib/constants-float64-num-high-word-significand-bits/lib/index.js
var require_lib64 = __commonJS({
  "node_modules/@stdlib/constants-float64-num-high-word-significand-bits/lib/index.js"(exports, module) {
    "use strict";
    var FLOAT64_NUM_HIGH_WORD_SIGNIFICAND_BITS = 20 | 0;
    module.exports = FLOAT64_NUM_HIGH_WORD_SIGNIFICAND_BITS;
  }
});

// node_modules/@stdlib/math-base-special-pow/lib/polyval_l.js
var require_polyval_l = __commonJS({
  "node_modules/@stdlib/math-base-special-pow/lib/polyval_l.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return 0.5999999999999946;
      }
      return 0.5999999999999946 + x * (0.4285714285785502 + x * (0.33333332981837743 + x * (0.272728123808534 + x * (0.23066074577556175 + x * 0.20697501780033842))));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-pow/lib/log2ax.js
var require_log2ax = __commonJS({
  "node_modules/@stdlib/math-base-special-pow/lib/log2ax.js"(exports, module) {
    "use strict";
    var getHighWord = require_lib28();
    var setLowWord = require_lib62();
    var setHighWord = require_lib29();
    var BIAS = require_lib34();
    var HIGH_NUM_SIGNIFICAND_BITS = require_lib64();
    var polyvalL = require_polyval_l();
    var HIGH_SIGNIFICAND_MASK = 1048575 | 0;
    var HIGH_MIN_NORMAL_EXP = 1048576 | 0;
    var HIGH_BIASED_EXP_0 = 1072693248 | 0;
    var HIGH_BIASED_EXP_NEG_512 = 536870912 | 0;
    var HIGH_SIGNIFICAND_HALF = 524288 | 0;
    var TWO53 = 9007199254740992;
    var CP = 0.9617966939259756;
    var CP_HI = 0.9617967009544373;
    var CP_LO = -7028461650952758e-24;
    var BP = [
      1,
      1.5
    ];
    var DP_HI = [
      0,
      0.5849624872207642
      // 0x3FE2B803, 0x40000000
    ];
    var DP_LO = [
      0,
      1350039202129749e-23
      // 0x3E4CFDEB, 0x43CFD006
    ];
    function log2ax(out, ax, ahx) {
      var tmp;
      var ss;
      var s2;
      var hs;
      var ls;
      var ht;
      var lt;
      var bp;
      var dp;
      var hp;
      var lp;
      var hz;
      var lz;
      var t1;
      var t2;
      var t;
      var r;
      var u;
      var v;
      var n;
      var j;
      var k;
      n = 0 | 0;
      if (ahx < HIGH_MIN_NORMAL_EXP) {
        ax *= TWO53;
        n -= 53 | 0;
        ahx = getHighWord(ax);
      }
      n += (ahx >> HIGH_NUM_SIGNIFICAND_BITS) - BIAS | 0;
      j = ahx & HIGH_SIGNIFICAND_MASK | 0;
      ahx = j | HIGH_BIASED_EXP_0 | 0;
      if (j <= 235662) {
        k = 0;
      } else if (j < 767610) {
        k = 1;
      } else {
        k = 0;
        n += 1 | 0;
        ahx -= HIGH_MIN_NORMAL_EXP;
      }
      ax = setHighWord(ax, ahx);
      bp = BP[k];
      u = ax - bp;
      v = 1 / (ax + bp);
      ss = u * v;
      hs = setLowWord(ss, 0);
      tmp = (ahx >> 1 | HIGH_BIASED_EXP_NEG_512) + HIGH_SIGNIFICAND_HALF;
      tmp += k << 18;
      ht = setHighWord(0, tmp);
      lt = ax - (ht - bp);
      ls = v * (u - hs * ht - hs * lt);
      s2 = ss * ss;
      r = s2 * s2 * polyvalL(s2);
      r += ls * (hs + ss);
      s2 = hs * hs;
      ht = 3 + s2 + r;
      ht = setLowWord(ht, 0);
      lt = r - (ht - 3 - s2);
      u = hs * ht;
      v = ls * ht + lt * ss;
      hp = u + v;
      hp = setLowWord(hp, 0);
      lp = v - (hp - u);
      hz = CP_HI * hp;
      lz = CP_LO * hp + lp * CP + DP_LO[k];
      dp = DP_HI[k];
      t = n;
      t1 = hz + lz + dp + t;
      t1 = setLowWord(t1, 0);
      t2 = lz - (t1 - t - dp - hz);
      out[0] = t1;
      out[1] = t2;
      return out;
    }
    module.exports = log2ax;
  }
});

// node_modules/@stdlib/math-base-special-pow/lib/polyval_w.js
var require_polyval_w = __commonJS({
  "node_modules/@stdlib/math-base-special-pow/lib/polyval_w.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return 0.5;
      }
      return 0.5 + x * (-0.3333333333333333 + x * 0.25);
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-pow/lib/logx.js
var require_logx = __commonJS({
  "node_modules/@stdlib/math-base-special-pow/lib/logx.js"(exports, module) {
    "use strict";
    var setLowWord = require_lib62();
    var polyvalW = require_polyval_w();
    var INV_LN2 = 1.4426950408889634;
    var INV_LN2_HI = 1.4426950216293335;
    var INV_LN2_LO = 19259629911266175e-24;
    function logx(out, ax) {
      var t2;
      var t1;
      var t;
      var w;
      var u;
      var v;
      t = ax - 1;
      w = t * t * polyvalW(t);
      u = INV_LN2_HI * t;
      v = t * INV_LN2_LO - w * INV_LN2;
      t1 = u + v;
      t1 = setLowWord(t1, 0);
      t2 = v - (t1 - u);
      out[0] = t1;
      out[1] = t2;
      return out;
    }
    module.exports = logx;
  }
});

// node_modules/@stdlib/constants-float64-ln-two/lib/index.js
var require_lib65 = __commonJS({
  "node_modules/@stdlib/constants-float64-ln-two/lib/index.js"(exports, module) {
    "use strict";
    var LN2 = 0.6931471805599453;
    module.exports = LN2;
  }
});

// node_modules/@stdlib/constants-float64-high-word-significand-mask/lib/index.js
var require_lib66 = __commonJS({
  "node_modules/@stdlib/constants-float64-high-word-significand-mask/lib/index.js"(exports, module) {
    "use strict";
    var FLOAT64_HIGH_WORD_SIGNIFICAND_MASK = 1048575;
    module.exports = FLOAT64_HIGH_WORD_SIGNIFICAND_MASK;
  }
});

// node_modules/@stdlib/math-base-special-pow/lib/polyval_p.js
var require_polyval_p2 = __commonJS({
  "node_modules/@stdlib/math-base-special-pow/lib/polyval_p.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return 0.16666666666666602;
      }
      return 0.16666666666666602 + x * (-0.0027777777777015593 + x * (6613756321437934e-20 + x * (-16533902205465252e-22 + x * 41381367970572385e-24)));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-pow/lib/pow2.js
var require_pow2 = __commonJS({
  "node_modules/@stdlib/math-base-special-pow/lib/pow2.js"(exports, module) {
    "use strict";
    var getHighWord = require_lib28();
    var setHighWord = require_lib29();
    var setLowWord = require_lib62();
    var uint32ToInt32 = require_lib63();
    var ldexp = require_lib57();
    var LN2 = require_lib65();
    var BIAS = require_lib34();
    var ABS_MASK = require_lib50();
    var HIGH_SIGNIFICAND_MASK = require_lib66();
    var HIGH_NUM_SIGNIFICAND_BITS = require_lib64();
    var polyvalP = require_polyval_p2();
    var HIGH_MIN_NORMAL_EXP = 1048576 | 0;
    var HIGH_BIASED_EXP_NEG_1 = 1071644672 | 0;
    var LN2_HI = 0.6931471824645996;
    var LN2_LO = -1904654299957768e-24;
    function pow2(j, hp, lp) {
      var tmp;
      var t1;
      var t;
      var r;
      var u;
      var v;
      var w;
      var z;
      var n;
      var i;
      var k;
      i = j & ABS_MASK | 0;
      k = (i >> HIGH_NUM_SIGNIFICAND_BITS) - BIAS | 0;
      n = 0;
      if (i > HIGH_BIASED_EXP_NEG_1) {
        n = j + (HIGH_MIN_NORMAL_EXP >> k + 1) >>> 0;
        k = ((n & ABS_MASK) >> HIGH_NUM_SIGNIFICAND_BITS) - BIAS | 0;
        tmp = (n & ~(HIGH_SIGNIFICAND_MASK >> k)) >>> 0;
        t = setHighWord(0, tmp);
        n = (n & HIGH_SIGNIFICAND_MASK | HIGH_MIN_NORMAL_EXP) >> HIGH_NUM_SIGNIFICAND_BITS - k >>> 0;
        if (j < 0) {
          n = -n;
        }
        hp -= t;
      }
      t = lp + hp;
      t = setLowWord(t, 0);
      u = t * LN2_HI;
      v = (lp - (t - hp)) * LN2 + t * LN2_LO;
      z = u + v;
      w = v - (z - u);
      t = z * z;
      t1 = z - t * polyvalP(t);
      r = z * t1 / (t1 - 2) - (w + z * w);
      z = 1 - (r - z);
      j = getHighWord(z);
      j = uint32ToInt32(j);
      j += n << HIGH_NUM_SIGNIFICAND_BITS >>> 0;
      if (j >> HIGH_NUM_SIGNIFICAND_BITS <= 0) {
        z = ldexp(z, n);
      } else {
        z = setHighWord(z, j);
      }
      return z;
    }
    module.exports = pow2;
  }
});

// node_modules/@stdlib/math-base-special-pow/lib/main.js
var require_main48 = __commonJS({
  "node_modules/@stdlib/math-base-special-pow/lib/main.js"(exports, module) {
    "use strict";
    var isnan = require_lib6();
    var isOdd = require_lib61();
    var isInfinite = require_lib48();
    var isInteger = require_lib59();
    var sqrt = require_lib39();
    var abs = require_lib42();
    var toWords = require_lib51();
    var setLowWord = require_lib62();
    var uint32ToInt32 = require_lib63();
    var NINF = require_lib33();
    var PINF = require_lib31();
    var ABS_MASK = require_lib50();
    var xIsZero = require_x_is_zero();
    var yIsHuge = require_y_is_huge();
    var yIsInfinite = require_y_is_infinite();
    var log2ax = require_log2ax();
    var logx = require_logx();
    var pow2 = require_pow2();
    var HIGH_MAX_NEAR_UNITY = 1072693247 | 0;
    var HIGH_BIASED_EXP_31 = 1105199104 | 0;
    var HIGH_BIASED_EXP_64 = 1139802112 | 0;
    var HIGH_BIASED_EXP_10 = 1083179008 | 0;
    var HIGH_BIASED_EXP_0 = 1072693248 | 0;
    var HIGH_1075 = 1083231232 | 0;
    var HIGH_NEG_1075 = 3230714880 >>> 0;
    var HIGH_NUM_NONSIGN_BITS = 31 | 0;
    var HUGE = 1e300;
    var TINY = 1e-300;
    var OVT = 8008566259537294e-32;
    var WORDS = [0 | 0, 0 | 0];
    var LOG_WORKSPACE = [0, 0];
    function pow(x, y) {
      var ahx;
      var ahy;
      var ax;
      var hx;
      var lx;
      var hy;
      var ly;
      var sx;
      var sy;
      var y1;
      var hp;
      var lp;
      var t;
      var z;
      var j;
      var i;
      if (isnan(x) || isnan(y)) {
        return NaN;
      }
      toWords.assign(y, WORDS, 1, 0);
      hy = WORDS[0];
      ly = WORDS[1];
      if (ly === 0) {
        if (y === 0) {
          return 1;
        }
        if (y === 1) {
          return x;
        }
        if (y === -1) {
          return 1 / x;
        }
        if (y === 0.5) {
          return sqrt(x);
        }
        if (y === -0.5) {
          return 1 / sqrt(x);
        }
        if (y === 2) {
          return x * x;
        }
        if (y === 3) {
          return x * x * x;
        }
        if (y === 4) {
          x *= x;
          return x * x;
        }
        if (isInfinite(y)) {
          return yIsInfinite(x, y);
        }
      }
      toWords.assign(x, WORDS, 1, 0);
      hx = WORDS[0];
      lx = WORDS[1];
      if (lx === 0) {
        if (hx === 0) {
          return xIsZero(x, y);
        }
        if (x === 1) {
          return 1;
        }
        if (x === -1 && isOdd(y)) {
          return -1;
        }
        if (isInfinite(x)) {
          if (x === NINF) {
            return pow(-0, -y);
          }
          if (y < 0) {
            return 0;
          }
          return PINF;
        }
      }
      if (x < 0 && isInteger(y) === false) {
        return (x - x) / (x - x);
      }
      ax = abs(x);
      ahx = hx & ABS_MASK | 0;
      ahy = hy & ABS_MASK | 0;
      sx = hx >>> HIGH_NUM_NONSIGN_BITS | 0;
      sy = hy >>> HIGH_NUM_NONSIGN_BITS | 0;
      if (sx && isOdd(y)) {
        sx = -1;
      } else {
        sx = 1;
      }
      if (ahy > HIGH_BIASED_EXP_31) {
        if (ahy > HIGH_BIASED_EXP_64) {
          return yIsHuge(x, y);
        }
        if (ahx < HIGH_MAX_NEAR_UNITY) {
          if (sy === 1) {
            return sx * HUGE * HUGE;
          }
          return sx * TINY * TINY;
        }
        if (ahx > HIGH_BIASED_EXP_0) {
          if (sy === 0) {
            return sx * HUGE * HUGE;
          }
          return sx * TINY * TINY;
        }
        t = logx(LOG_WORKSPACE, ax);
      } else {
        t = log2ax(LOG_WORKSPACE, ax, ahx);
      }
      y1 = setLowWord(y, 0);
      lp = (y - y1) * t[0] + y * t[1];
      hp = y1 * t[0];
      z = lp + hp;
      toWords.assign(z, WORDS, 1, 0);
      j = uint32ToInt32(WORDS[0]);
      i = uint32ToInt32(WORDS[1]);
      if (j >= HIGH_BIASED_EXP_10) {
        if ((j - HIGH_BIASED_EXP_10 | i) !== 0) {
          return sx * HUGE * HUGE;
        }
        if (lp + OVT > z - hp) {
          return sx * HUGE * HUGE;
        }
      } else if ((j & ABS_MASK) >= HIGH_1075) {
        if ((j - HIGH_NEG_1075 | i) !== 0) {
          return sx * TINY * TINY;
        }
        if (lp <= z - hp) {
          return sx * TINY * TINY;
        }
      }
      z = pow2(j, hp, lp);
      return sx * z;
    }
    module.exports = pow;
  }
});

// node_modules/@stdlib/math-base-special-pow/lib/index.js
var require_lib67 = __commonJS({
  "node_modules/@stdlib/math-base-special-pow/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main48();
    module.exports = main;
  }
});

// node_modules/@stdlib/constants-float64-e/lib/index.js
var require_lib68 = __commonJS({
  "node_modules/@stdlib/constants-float64-e/lib/index.js"(exports, module) {
    "use strict";
    var E = 2.718281828459045;
    module.exports = E;
  }
});

// node_modules/@stdlib/constants-float64-eps/lib/index.js
var require_lib69 = __commonJS({
  "node_modules/@stdlib/constants-float64-eps/lib/index.js"(exports, module) {
    "use strict";
    var FLOAT64_EPSILON = 2220446049250313e-31;
    module.exports = FLOAT64_EPSILON;
  }
});

// node_modules/@stdlib/math-base-special-beta/lib/lanczos_sum_expg_scaled.js
var require_lanczos_sum_expg_scaled = __commonJS({
  "node_modules/@stdlib/math-base-special-beta/lib/lanczos_sum_expg_scaled.js"(exports, module) {
    "use strict";
    function evalrational(x) {
      var ax;
      var s1;
      var s2;
      if (x === 0) {
        return Infinity;
      }
      if (x < 0) {
        ax = -x;
      } else {
        ax = x;
      }
      if (ax <= 1) {
        s1 = 709811.662581658 + x * (679979.8474157227 + x * (293136.7857211597 + x * (74887.54032914672 + x * (12555.290582413863 + x * (1443.4299244417066 + x * (115.24194596137347 + x * (6.309239205732627 + x * (0.22668404630224365 + x * (0.004826466289237662 + x * 4624429436045379e-20)))))))));
        s2 = 0 + x * (362880 + x * (1026576 + x * (1172700 + x * (723680 + x * (269325 + x * (63273 + x * (9450 + x * (870 + x * (45 + x * 1)))))))));
      } else {
        x = 1 / x;
        s1 = 4624429436045379e-20 + x * (0.004826466289237662 + x * (0.22668404630224365 + x * (6.309239205732627 + x * (115.24194596137347 + x * (1443.4299244417066 + x * (12555.290582413863 + x * (74887.54032914672 + x * (293136.7857211597 + x * (679979.8474157227 + x * 709811.662581658)))))))));
        s2 = 1 + x * (45 + x * (870 + x * (9450 + x * (63273 + x * (269325 + x * (723680 + x * (1172700 + x * (1026576 + x * (362880 + x * 0)))))))));
      }
      return s1 / s2;
    }
    module.exports = evalrational;
  }
});

// node_modules/@stdlib/math-base-special-beta/lib/main.js
var require_main49 = __commonJS({
  "node_modules/@stdlib/math-base-special-beta/lib/main.js"(exports, module) {
    "use strict";
    var isnan = require_lib6();
    var log1p = require_lib38();
    var sqrt = require_lib39();
    var abs = require_lib42();
    var exp9 = require_lib58();
    var pow = require_lib67();
    var E = require_lib68();
    var EPSILON = require_lib69();
    var lanczosSumExpGScaled = require_lanczos_sum_expg_scaled();
    var G = 10.900511;
    function beta(a, b) {
      var ambh;
      var agh;
      var bgh;
      var cgh;
      var res;
      var tmp;
      var c;
      if (isnan(a) || isnan(b)) {
        return NaN;
      }
      if (a < 0 || b < 0) {
        return NaN;
      }
      if (b === 1) {
        return 1 / a;
      }
      if (a === 1) {
        return 1 / b;
      }
      c = a + b;
      if (c < EPSILON) {
        res = c / a;
        res /= b;
        return res;
      }
      if (c === a && b < EPSILON) {
        return 1 / b;
      }
      if (c === b && a < EPSILON) {
        return 1 / a;
      }
      if (a < b) {
        tmp = b;
        b = a;
        a = tmp;
      }
      agh = a + G - 0.5;
      bgh = b + G - 0.5;
      cgh = c + G - 0.5;
      res = lanczosSumExpGScaled(a) * (lanczosSumExpGScaled(b) / lanczosSumExpGScaled(c));
      ambh = a - 0.5 - b;
      if (abs(b * ambh) < cgh * 100 && a > 100) {
        res *= exp9(ambh * log1p(-b / cgh));
      } else {
        res *= pow(agh / cgh, ambh);
      }
      if (cgh > 1e10) {
        res *= pow(agh / cgh * (bgh / cgh), b);
      } else {
        res *= pow(agh * bgh / (cgh * cgh), b);
      }
      res *= sqrt(E / bgh);
      return res;
    }
    module.exports = beta;
  }
});

// node_modules/@stdlib/math-base-special-beta/lib/index.js
var require_lib70 = __commonJS({
  "node_modules/@stdlib/math-base-special-beta/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main49();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-assert-is-positive-zero/lib/main.js
var require_main50 = __commonJS({
  "node_modules/@stdlib/math-base-assert-is-positive-zero/lib/main.js"(exports, module) {
    "use strict";
    var PINF = require_lib31();
    function isPositiveZero(x) {
      return x === 0 && 1 / x === PINF;
    }
    module.exports = isPositiveZero;
  }
});

// node_modules/@stdlib/math-base-assert-is-positive-zero/lib/index.js
var require_lib71 = __commonJS({
  "node_modules/@stdlib/math-base-assert-is-positive-zero/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main50();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-special-max/lib/main.js
var require_main51 = __commonJS({
  "node_modules/@stdlib/math-base-special-max/lib/main.js"(exports, module) {
    "use strict";
    var isPositiveZero = require_lib71();
    var isnan = require_lib6();
    var PINF = require_lib31();
    function max(x, y) {
      if (isnan(x) || isnan(y)) {
        return NaN;
      }
      if (x === PINF || y === PINF) {
        return PINF;
      }
      if (x === y && x === 0) {
        if (isPositiveZero(x)) {
          return x;
        }
        return y;
      }
      if (x > y) {
        return x;
      }
      return y;
    }
    module.exports = max;
  }
});

// node_modules/@stdlib/math-base-special-max/lib/index.js
var require_lib72 = __commonJS({
  "node_modules/@stdlib/math-base-special-max/lib/index.js"(exports, module) {
    "use strict";
    var max = require_main51();
    module.exports = max;
  }
});

// node_modules/@stdlib/math-base-assert-is-negative-zero/lib/main.js
var require_main52 = __commonJS({
  "node_modules/@stdlib/math-base-assert-is-negative-zero/lib/main.js"(exports, module) {
    "use strict";
    var NINF = require_lib33();
    function isNegativeZero(x) {
      return x === 0 && 1 / x === NINF;
    }
    module.exports = isNegativeZero;
  }
});

// node_modules/@stdlib/math-base-assert-is-negative-zero/lib/index.js
var require_lib73 = __commonJS({
  "node_modules/@stdlib/math-base-assert-is-negative-zero/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main52();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-special-min/lib/main.js
var require_main53 = __commonJS({
  "node_modules/@stdlib/math-base-special-min/lib/main.js"(exports, module) {
    "use strict";
    var isNegativeZero = require_lib73();
    var isnan = require_lib6();
    var NINF = require_lib33();
    function min(x, y) {
      if (isnan(x) || isnan(y)) {
        return NaN;
      }
      if (x === NINF || y === NINF) {
        return NINF;
      }
      if (x === y && x === 0) {
        if (isNegativeZero(x)) {
          return x;
        }
        return y;
      }
      if (x < y) {
        return x;
      }
      return y;
    }
    module.exports = min;
  }
});

// node_modules/@stdlib/math-base-special-min/lib/index.js
var require_lib74 = __commonJS({
  "node_modules/@stdlib/math-base-special-min/lib/index.js"(exports, module) {
    "use strict";
    var min = require_main53();
    module.exports = min;
  }
});

// node_modules/@stdlib/constants-float64-max/lib/index.js
var require_lib75 = __commonJS({
  "node_modules/@stdlib/constants-float64-max/lib/index.js"(exports, module) {
    "use strict";
    var FLOAT64_MAX = 17976931348623157e292;
    module.exports = FLOAT64_MAX;
  }
});

// node_modules/@stdlib/constants-int32-max/lib/index.js
var require_lib76 = __commonJS({
  "node_modules/@stdlib/constants-int32-max/lib/index.js"(exports, module) {
    "use strict";
    var INT32_MAX = 2147483647 | 0;
    module.exports = INT32_MAX;
  }
});

// node_modules/@stdlib/constants-float64-half-pi/lib/index.js
var require_lib77 = __commonJS({
  "node_modules/@stdlib/constants-float64-half-pi/lib/index.js"(exports, module) {
    "use strict";
    var HALF_PI = 1.5707963267948966;
    module.exports = HALF_PI;
  }
});

// node_modules/@stdlib/constants-float64-pi/lib/index.js
var require_lib78 = __commonJS({
  "node_modules/@stdlib/constants-float64-pi/lib/index.js"(exports, module) {
    "use strict";
    var PI = 3.141592653589793;
    module.exports = PI;
  }
});

// node_modules/@stdlib/math-base-special-kernel-cos/lib/polyval_c13.js
var require_polyval_c13 = __commonJS({
  "node_modules/@stdlib/math-base-special-kernel-cos/lib/polyval_c13.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return 0.0416666666666666;
      }
      return 0.0416666666666666 + x * (-0.001388888888887411 + x * 2480158728947673e-20);
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-kernel-cos/lib/polyval_c46.js
var require_polyval_c46 = __commonJS({
  "node_modules/@stdlib/math-base-special-kernel-cos/lib/polyval_c46.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return -27557314351390663e-23;
      }
      return -27557314351390663e-23 + x * (2087572321298175e-24 + x * -11359647557788195e-27);
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-kernel-cos/lib/main.js
var require_main54 = __commonJS({
  "node_modules/@stdlib/math-base-special-kernel-cos/lib/main.js"(exports, module) {
    "use strict";
    var polyval13 = require_polyval_c13();
    var polyval46 = require_polyval_c46();
    function kernelCos(x, y) {
      var hz;
      var r;
      var w;
      var z;
      z = x * x;
      w = z * z;
      r = z * polyval13(z);
      r += w * w * polyval46(z);
      hz = 0.5 * z;
      w = 1 - hz;
      return w + (1 - w - hz + (z * r - x * y));
    }
    module.exports = kernelCos;
  }
});

// node_modules/@stdlib/math-base-special-kernel-cos/lib/index.js
var require_lib79 = __commonJS({
  "node_modules/@stdlib/math-base-special-kernel-cos/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main54();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-special-kernel-sin/lib/main.js
var require_main55 = __commonJS({
  "node_modules/@stdlib/math-base-special-kernel-sin/lib/main.js"(exports, module) {
    "use strict";
    var S1 = -0.16666666666666632;
    var S2 = 0.00833333333332249;
    var S3 = -1984126982985795e-19;
    var S4 = 27557313707070068e-22;
    var S5 = -25050760253406863e-24;
    var S6 = 158969099521155e-24;
    function kernelSin(x, y) {
      var r;
      var v;
      var w;
      var z;
      z = x * x;
      w = z * z;
      r = S2 + z * (S3 + z * S4) + z * w * (S5 + z * S6);
      v = z * x;
      if (y === 0) {
        return x + v * (S1 + z * r);
      }
      return x - (z * (0.5 * y - v * r) - y - v * S1);
    }
    module.exports = kernelSin;
  }
});

// node_modules/@stdlib/math-base-special-kernel-sin/lib/index.js
var require_lib80 = __commonJS({
  "node_modules/@stdlib/math-base-special-kernel-sin/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main55();
    module.exports = main;
  }
});

// node_modules/@stdlib/number-float64-base-get-low-word/lib/low.js
var require_low2 = __commonJS({
  "node_modules/@stdlib/number-float64-base-get-low-word/lib/low.js"(exports, module) {
    "use strict";
    var isLittleEndian = require_lib27();
    var LOW;
    if (isLittleEndian === true) {
      LOW = 0;
    } else {
      LOW = 1;
    }
    module.exports = LOW;
  }
});

// node_modules/@stdlib/number-float64-base-get-low-word/lib/main.js
var require_main56 = __commonJS({
  "node_modules/@stdlib/number-float64-base-get-low-word/lib/main.js"(exports, module) {
    "use strict";
    var Uint32Array2 = require_lib15();
    var Float64Array2 = require_lib18();
    var LOW = require_low2();
    var FLOAT64_VIEW = new Float64Array2(1);
    var UINT32_VIEW = new Uint32Array2(FLOAT64_VIEW.buffer);
    function getLowWord(x) {
      FLOAT64_VIEW[0] = x;
      return UINT32_VIEW[LOW];
    }
    module.exports = getLowWord;
  }
});

// node_modules/@stdlib/number-float64-base-get-low-word/lib/index.js
var require_lib81 = __commonJS({
  "node_modules/@stdlib/number-float64-base-get-low-word/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main56();
    module.exports = main;
  }
});

// node_modules/@stdlib/array-base-filled/lib/main.js
var require_main57 = __commonJS({
  "node_modules/@stdlib/array-base-filled/lib/main.js"(exports, module) {
    "use strict";
    function filled(value, len) {
      var arr;
      var i;
      arr = [];
      for (i = 0; i < len; i++) {
        arr.push(value);
      }
      return arr;
    }
    module.exports = filled;
  }
});

// node_modules/@stdlib/array-base-filled/lib/index.js
var require_lib82 = __commonJS({
  "node_modules/@stdlib/array-base-filled/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main57();
    module.exports = main;
  }
});

// node_modules/@stdlib/array-base-zeros/lib/main.js
var require_main58 = __commonJS({
  "node_modules/@stdlib/array-base-zeros/lib/main.js"(exports, module) {
    "use strict";
    var filled = require_lib82();
    function zeros(len) {
      return filled(0, len);
    }
    module.exports = zeros;
  }
});

// node_modules/@stdlib/array-base-zeros/lib/index.js
var require_lib83 = __commonJS({
  "node_modules/@stdlib/array-base-zeros/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main58();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-special-rempio2/lib/kernel_rempio2.js
var require_kernel_rempio2 = __commonJS({
  "node_modules/@stdlib/math-base-special-rempio2/lib/kernel_rempio2.js"(exports, module) {
    "use strict";
    var floor = require_lib37();
    var ldexp = require_lib57();
    var zeros = require_lib83();
    var IPIO2 = [
      10680707,
      7228996,
      1387004,
      2578385,
      16069853,
      12639074,
      9804092,
      4427841,
      16666979,
      11263675,
      12935607,
      2387514,
      4345298,
      14681673,
      3074569,
      13734428,
      16653803,
      1880361,
      10960616,
      8533493,
      3062596,
      8710556,
      7349940,
      6258241,
      3772886,
      3769171,
      3798172,
      8675211,
      12450088,
      3874808,
      9961438,
      366607,
      15675153,
      9132554,
      7151469,
      3571407,
      2607881,
      12013382,
      4155038,
      6285869,
      7677882,
      13102053,
      15825725,
      473591,
      9065106,
      15363067,
      6271263,
      9264392,
      5636912,
      4652155,
      7056368,
      13614112,
      10155062,
      1944035,
      9527646,
      15080200,
      6658437,
      6231200,
      6832269,
      16767104,
      5075751,
      3212806,
      1398474,
      7579849,
      6349435,
      12618859
    ];
    var PIO2 = [
      1.570796251296997,
      // 0x3FF921FB, 0x40000000
      7549789415861596e-23,
      // 0x3E74442D, 0x00000000
      5390302529957765e-30,
      // 0x3CF84698, 0x80000000
      3282003415807913e-37,
      // 0x3B78CC51, 0x60000000
      1270655753080676e-44,
      // 0x39F01B83, 0x80000000
      12293330898111133e-52,
      // 0x387A2520, 0x40000000
      27337005381646456e-60,
      // 0x36E38222, 0x80000000
      21674168387780482e-67
      // 0x3569F31D, 0x00000000
    ];
    var TWO24 = 16777216;
    var TWON24 = 5960464477539063e-23;
    var F = zeros(20);
    var Q = zeros(20);
    var FQ = zeros(20);
    var IQ = zeros(20);
    function compute2(x, y, jz, q, q0, jk, jv, jx, f) {
      var carry;
      var fw;
      var ih;
      var jp;
      var i;
      var k;
      var n;
      var j;
      var z;
      jp = jk;
      z = q[jz];
      j = jz;
      for (i = 0; j > 0; i++) {
        fw = TWON24 * z | 0;
        IQ[i] = z - TWO24 * fw | 0;
        z = q[j - 1] + fw;
        j -= 1;
      }
      z = ldexp(z, q0);
      z -= 8 * floor(z * 0.125);
      n = z | 0;
      z -= n;
      ih = 0;
      if (q0 > 0) {
        i = IQ[jz - 1] >> 24 - q0;
        n += i;
        IQ[jz - 1] -= i << 24 - q0;
        ih = IQ[jz - 1] >> 23 - q0;
      } else if (q0 === 0) {
        ih = IQ[jz - 1] >> 23;
      } else if (z >= 0.5) {
        ih = 2;
      }
      if (ih > 0) {
        n += 1;
        carry = 0;
        for (i = 0; i < jz; i++) {
          j = IQ[i];
          if (carry === 0) {
            if (j !== 0) {
              carry = 1;
              IQ[i] = 16777216 - j;
            }
          } else {
            IQ[i] = 16777215 - j;
          }
        }
        if (q0 > 0) {
          switch (q0) {
            // eslint-disable-line default-case
            case 1:
              IQ[jz - 1] &= 8388607;
              break;
            case 2:
              IQ[jz - 1] &= 4194303;
              break;
          }
        }
        if (ih === 2) {
          z = 1 - z;
          if (carry !== 0) {
            z -= ldexp(1, q0);
          }
        }
      }
      if (z === 0) {
        j = 0;
        for (i = jz - 1; i >= jk; i--) {
          j |= IQ[i];
        }
        if (j === 0) {
          for (k = 1; IQ[jk - k] === 0; k++) {
          }
          for (i = jz + 1; i <= jz + k; i++) {
            f[jx + i] = IPIO2[jv + i];
            fw = 0;
            for (j = 0; j <= jx; j++) {
              fw += x[j] * f[jx + (i - j)];
            }
            q[i] = fw;
          }
          jz += k;
          return compute2(x, y, jz, q, q0, jk, jv, jx, f);
        }
        jz -= 1;
        q0 -= 24;
        while (IQ[jz] === 0) {
          jz -= 1;
          q0 -= 24;
        }
      } else {
        z = ldexp(z, -q0);
        if (z >= TWO24) {
          fw = TWON24 * z | 0;
          IQ[jz] = z - TWO24 * fw | 0;
          jz += 1;
          q0 += 24;
          IQ[jz] = fw;
        } else {
          IQ[jz] = z | 0;
        }
      }
      fw = ldexp(1, q0);
      for (i = jz; i >= 0; i--) {
        q[i] = fw * IQ[i];
        fw *= TWON24;
      }
      for (i = jz; i >= 0; i--) {
        fw = 0;
        for (k = 0; k <= jp && k <= jz - i; k++) {
          fw += PIO2[k] * q[i + k];
        }
        FQ[jz - i] = fw;
      }
      fw = 0;
      for (i = jz; i >= 0; i--) {
        fw += FQ[i];
      }
      if (ih === 0) {
        y[0] = fw;
      } else {
        y[0] = -fw;
      }
      fw = FQ[0] - fw;
      for (i = 1; i <= jz; i++) {
        fw += FQ[i];
      }
      if (ih === 0) {
        y[1] = fw;
      } else {
        y[1] = -fw;
      }
      return n & 7;
    }
    function kernelRempio2(x, y, e0, nx) {
      var fw;
      var jk;
      var jv;
      var jx;
      var jz;
      var q0;
      var i;
      var j;
      var m;
      jk = 4;
      jx = nx - 1;
      jv = (e0 - 3) / 24 | 0;
      if (jv < 0) {
        jv = 0;
      }
      q0 = e0 - 24 * (jv + 1);
      j = jv - jx;
      m = jx + jk;
      for (i = 0; i <= m; i++) {
        if (j < 0) {
          F[i] = 0;
        } else {
          F[i] = IPIO2[j];
        }
        j += 1;
      }
      for (i = 0; i <= jk; i++) {
        fw = 0;
        for (j = 0; j <= jx; j++) {
          fw += x[j] * F[jx + (i - j)];
        }
        Q[i] = fw;
      }
      jz = jk;
      return compute2(x, y, jz, Q, q0, jk, jv, jx, F);
    }
    module.exports = kernelRempio2;
  }
});

// node_modules/@stdlib/math-base-special-round/lib/main.js
var require_main59 = __commonJS({
  "node_modules/@stdlib/math-base-special-round/lib/main.js"(exports, module) {
    "use strict";
    var round = Math.round;
    module.exports = round;
  }
});

// node_modules/@stdlib/math-base-special-round/lib/index.js
var require_lib84 = __commonJS({
  "node_modules/@stdlib/math-base-special-round/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main59();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-special-rempio2/lib/rempio2_medium.js
var require_rempio2_medium = __commonJS({
  "node_modules/@stdlib/math-base-special-rempio2/lib/rempio2_medium.js"(exports, module) {
    "use strict";
    var round = require_lib84();
    var getHighWord = require_lib28();
    var INVPIO2 = 0.6366197723675814;
    var PIO2_1 = 1.5707963267341256;
    var PIO2_1T = 6077100506506192e-26;
    var PIO2_2 = 6077100506303966e-26;
    var PIO2_2T = 20222662487959506e-37;
    var PIO2_3 = 20222662487111665e-37;
    var PIO2_3T = 84784276603689e-45;
    var EXPONENT_MASK = 2047 | 0;
    function rempio2Medium(x, ix, y) {
      var high;
      var n;
      var t;
      var r;
      var w;
      var i;
      var j;
      n = round(x * INVPIO2);
      r = x - n * PIO2_1;
      w = n * PIO2_1T;
      j = ix >> 20 | 0;
      y[0] = r - w;
      high = getHighWord(y[0]);
      i = j - (high >> 20 & EXPONENT_MASK);
      if (i > 16) {
        t = r;
        w = n * PIO2_2;
        r = t - w;
        w = n * PIO2_2T - (t - r - w);
        y[0] = r - w;
        high = getHighWord(y[0]);
        i = j - (high >> 20 & EXPONENT_MASK);
        if (i > 49) {
          t = r;
          w = n * PIO2_3;
          r = t - w;
          w = n * PIO2_3T - (t - r - w);
          y[0] = r - w;
        }
      }
      y[1] = r - y[0] - w;
      return n;
    }
    module.exports = rempio2Medium;
  }
});

// node_modules/@stdlib/math-base-special-rempio2/lib/main.js
var require_main60 = __commonJS({
  "node_modules/@stdlib/math-base-special-rempio2/lib/main.js"(exports, module) {
    "use strict";
    var ABS_MASK = require_lib50();
    var EXPONENT_MASK = require_lib55();
    var SIGNIFICAND_MASK = require_lib66();
    var getHighWord = require_lib28();
    var getLowWord = require_lib81();
    var fromWords = require_lib30();
    var rempio2Kernel = require_kernel_rempio2();
    var rempio2Medium = require_rempio2_medium();
    var ZERO = 0;
    var TWO24 = 16777216;
    var PIO2_1 = 1.5707963267341256;
    var PIO2_1T = 6077100506506192e-26;
    var TWO_PIO2_1T = 2 * PIO2_1T;
    var THREE_PIO2_1T = 3 * PIO2_1T;
    var FOUR_PIO2_1T = 4 * PIO2_1T;
    var PI_HIGH_WORD_SIGNIFICAND = 598523 | 0;
    var PIO4_HIGH_WORD = 1072243195 | 0;
    var THREE_PIO4_HIGH_WORD = 1073928572 | 0;
    var FIVE_PIO4_HIGH_WORD = 1074752122 | 0;
    var THREE_PIO2_HIGH_WORD = 1074977148 | 0;
    var SEVEN_PIO4_HIGH_WORD = 1075183036 | 0;
    var TWO_PI_HIGH_WORD = 1075388923 | 0;
    var NINE_PIO4_HIGH_WORD = 1075594811 | 0;
    var MEDIUM = 1094263291 | 0;
    var TX = [0, 0, 0];
    var TY = [0, 0];
    function rempio2(x, y) {
      var low;
      var e0;
      var hx;
      var ix;
      var nx;
      var i;
      var n;
      var z;
      hx = getHighWord(x) | 0;
      ix = hx & ABS_MASK | 0;
      if (ix <= PIO4_HIGH_WORD) {
        y[0] = x;
        y[1] = 0;
        return 0;
      }
      if (ix <= FIVE_PIO4_HIGH_WORD) {
        if ((ix & SIGNIFICAND_MASK) === PI_HIGH_WORD_SIGNIFICAND) {
          return rempio2Medium(x, ix, y);
        }
        if (ix <= THREE_PIO4_HIGH_WORD) {
          if (hx > 0) {
            z = x - PIO2_1;
            y[0] = z - PIO2_1T;
            y[1] = z - y[0] - PIO2_1T;
            return 1;
          }
          z = x + PIO2_1;
          y[0] = z + PIO2_1T;
          y[1] = z - y[0] + PIO2_1T;
          return -1;
        }
        if (hx > 0) {
          z = x - 2 * PIO2_1;
          y[0] = z - TWO_PIO2_1T;
          y[1] = z - y[0] - TWO_PIO2_1T;
          return 2;
        }
        z = x + 2 * PIO2_1;
        y[0] = z + TWO_PIO2_1T;
        y[1] = z - y[0] + TWO_PIO2_1T;
        return -2;
      }
      if (ix <= NINE_PIO4_HIGH_WORD) {
        if (ix <= SEVEN_PIO4_HIGH_WORD) {
          if (ix === THREE_PIO2_HIGH_WORD) {
            return rempio2Medium(x, ix, y);
          }
          if (hx > 0) {
            z = x - 3 * PIO2_1;
            y[0] = z - THREE_PIO2_1T;
            y[1] = z - y[0] - THREE_PIO2_1T;
            return 3;
          }
          z = x + 3 * PIO2_1;
          y[0] = z + THREE_PIO2_1T;
          y[1] = z - y[0] + THREE_PIO2_1T;
          return -3;
        }
        if (ix === TWO_PI_HIGH_WORD) {
          return rempio2Medium(x, ix, y);
        }
        if (hx > 0) {
          z = x - 4 * PIO2_1;
          y[0] = z - FOUR_PIO2_1T;
          y[1] = z - y[0] - FOUR_PIO2_1T;
          return 4;
        }
        z = x + 4 * PIO2_1;
        y[0] = z + FOUR_PIO2_1T;
        y[1] = z - y[0] + FOUR_PIO2_1T;
        return -4;
      }
      if (ix < MEDIUM) {
        return rempio2Medium(x, ix, y);
      }
      if (ix >= EXPONENT_MASK) {
        y[0] = NaN;
        y[1] = NaN;
        return 0;
      }
      low = getLowWord(x);
      e0 = (ix >> 20) - 1046;
      z = fromWords(ix - (e0 << 20 | 0), low);
      for (i = 0; i < 2; i++) {
        TX[i] = z | 0;
        z = (z - TX[i]) * TWO24;
      }
      TX[2] = z;
      nx = 3;
      while (TX[nx - 1] === ZERO) {
        nx -= 1;
      }
      n = rempio2Kernel(TX, TY, e0, nx, 1);
      if (hx < 0) {
        y[0] = -TY[0];
        y[1] = -TY[1];
        return -n;
      }
      y[0] = TY[0];
      y[1] = TY[1];
      return n;
    }
    module.exports = rempio2;
  }
});

// node_modules/@stdlib/math-base-special-rempio2/lib/index.js
var require_lib85 = __commonJS({
  "node_modules/@stdlib/math-base-special-rempio2/lib/index.js"(exports, module) {
    "use strict";
    var rempio2 = require_main60();
    module.exports = rempio2;
  }
});

// node_modules/@stdlib/math-base-special-sin/lib/main.js
var require_main61 = __commonJS({
  "node_modules/@stdlib/math-base-special-sin/lib/main.js"(exports, module) {
    "use strict";
    var HIGH_WORD_ABS_MASK = require_lib50();
    var HIGH_WORD_EXPONENT_MASK = require_lib55();
    var getHighWord = require_lib28();
    var kernelCos = require_lib79();
    var kernelSin = require_lib80();
    var rempio2 = require_lib85();
    var PIO4_HIGH_WORD = 1072243195 | 0;
    var SMALL_HIGH_WORD = 1045430272 | 0;
    var Y = [0, 0];
    function sin(x) {
      var ix;
      var n;
      ix = getHighWord(x);
      ix &= HIGH_WORD_ABS_MASK;
      if (ix <= PIO4_HIGH_WORD) {
        if (ix < SMALL_HIGH_WORD) {
          return x;
        }
        return kernelSin(x, 0);
      }
      if (ix >= HIGH_WORD_EXPONENT_MASK) {
        return NaN;
      }
      n = rempio2(x, Y);
      switch (n & 3) {
        case 0:
          return kernelSin(Y[0], Y[1]);
        case 1:
          return kernelCos(Y[0], Y[1]);
        case 2:
          return -kernelSin(Y[0], Y[1]);
        default:
          return -kernelCos(Y[0], Y[1]);
      }
    }
    module.exports = sin;
  }
});

// node_modules/@stdlib/math-base-special-sin/lib/index.js
var require_lib86 = __commonJS({
  "node_modules/@stdlib/math-base-special-sin/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main61();
    module.exports = main;
  }
});

// node_modules/@stdlib/constants-float64-sqrt-two-pi/lib/index.js
var require_lib87 = __commonJS({
  "node_modules/@stdlib/constants-float64-sqrt-two-pi/lib/index.js"(exports, module) {
    "use strict";
    var SQRT_TWO_PI = 2.5066282746310007;
    module.exports = SQRT_TWO_PI;
  }
});

// node_modules/@stdlib/math-base-special-gamma/lib/polyval_s.js
var require_polyval_s = __commonJS({
  "node_modules/@stdlib/math-base-special-gamma/lib/polyval_s.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return 0.08333333333334822;
      }
      return 0.08333333333334822 + x * (0.0034722222160545866 + x * (-0.0026813261780578124 + x * (-22954996161337813e-20 + x * 7873113957930937e-19)));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-gamma/lib/stirling_approximation.js
var require_stirling_approximation = __commonJS({
  "node_modules/@stdlib/math-base-special-gamma/lib/stirling_approximation.js"(exports, module) {
    "use strict";
    var SQRT_TWO_PI = require_lib87();
    var pow = require_lib67();
    var exp9 = require_lib58();
    var polyval = require_polyval_s();
    var MAX_STIRLING = 143.01608;
    function gamma2(x) {
      var w;
      var y;
      var v;
      w = 1 / x;
      w = 1 + w * polyval(w);
      y = exp9(x);
      if (x > MAX_STIRLING) {
        v = pow(x, 0.5 * x - 0.25);
        y = v * (v / y);
      } else {
        y = pow(x, x - 0.5) / y;
      }
      return SQRT_TWO_PI * y * w;
    }
    module.exports = gamma2;
  }
});

// node_modules/@stdlib/constants-float64-eulergamma/lib/index.js
var require_lib88 = __commonJS({
  "node_modules/@stdlib/constants-float64-eulergamma/lib/index.js"(exports, module) {
    "use strict";
    var EULERGAMMA = 0.5772156649015329;
    module.exports = EULERGAMMA;
  }
});

// node_modules/@stdlib/math-base-special-gamma/lib/small_approximation.js
var require_small_approximation = __commonJS({
  "node_modules/@stdlib/math-base-special-gamma/lib/small_approximation.js"(exports, module) {
    "use strict";
    var EULER = require_lib88();
    function gamma2(x, z) {
      return z / ((1 + EULER * x) * x);
    }
    module.exports = gamma2;
  }
});

// node_modules/@stdlib/math-base-special-gamma/lib/rational_pq.js
var require_rational_pq2 = __commonJS({
  "node_modules/@stdlib/math-base-special-gamma/lib/rational_pq.js"(exports, module) {
    "use strict";
    function evalrational(x) {
      var ax;
      var s1;
      var s2;
      if (x === 0) {
        return 1;
      }
      if (x < 0) {
        ax = -x;
      } else {
        ax = x;
      }
      if (ax <= 1) {
        s1 = 1 + x * (0.4942148268014971 + x * (0.20744822764843598 + x * (0.04763678004571372 + x * (0.010421379756176158 + x * (0.0011913514700658638 + x * (16011952247675185e-20 + x * 0))))));
        s2 = 1 + x * (0.0714304917030273 + x * (-0.23459179571824335 + x * (0.035823639860549865 + x * (0.011813978522206043 + x * (-0.004456419138517973 + x * (5396055804933034e-19 + x * -23158187332412014e-21))))));
      } else {
        x = 1 / x;
        s1 = 0 + x * (16011952247675185e-20 + x * (0.0011913514700658638 + x * (0.010421379756176158 + x * (0.04763678004571372 + x * (0.20744822764843598 + x * (0.4942148268014971 + x * 1))))));
        s2 = -23158187332412014e-21 + x * (5396055804933034e-19 + x * (-0.004456419138517973 + x * (0.011813978522206043 + x * (0.035823639860549865 + x * (-0.23459179571824335 + x * (0.0714304917030273 + x * 1))))));
      }
      return s1 / s2;
    }
    module.exports = evalrational;
  }
});

// node_modules/@stdlib/math-base-special-gamma/lib/main.js
var require_main62 = __commonJS({
  "node_modules/@stdlib/math-base-special-gamma/lib/main.js"(exports, module) {
    "use strict";
    var isnan = require_lib6();
    var isInteger = require_lib59();
    var isNegativeZero = require_lib73();
    var abs = require_lib42();
    var floor = require_lib37();
    var sin = require_lib86();
    var PINF = require_lib31();
    var NINF = require_lib33();
    var PI = require_lib78();
    var stirlingApprox = require_stirling_approximation();
    var smallApprox = require_small_approximation();
    var rateval = require_rational_pq2();
    function gamma2(x) {
      var sign;
      var q;
      var p;
      var z;
      if (isInteger(x) && x < 0 || x === NINF || isnan(x)) {
        return NaN;
      }
      if (x === 0) {
        if (isNegativeZero(x)) {
          return NINF;
        }
        return PINF;
      }
      if (x > 171.61447887182297) {
        return PINF;
      }
      if (x < -170.5674972726612) {
        return 0;
      }
      q = abs(x);
      if (q > 33) {
        if (x >= 0) {
          return stirlingApprox(x);
        }
        p = floor(q);
        if ((p & 1) === 0) {
          sign = -1;
        } else {
          sign = 1;
        }
        z = q - p;
        if (z > 0.5) {
          p += 1;
          z = q - p;
        }
        z = q * sin(PI * z);
        return sign * PI / (abs(z) * stirlingApprox(q));
      }
      z = 1;
      while (x >= 3) {
        x -= 1;
        z *= x;
      }
      while (x < 0) {
        if (x > -1e-9) {
          return smallApprox(x, z);
        }
        z /= x;
        x += 1;
      }
      while (x < 2) {
        if (x < 1e-9) {
          return smallApprox(x, z);
        }
        z /= x;
        x += 1;
      }
      if (x === 2) {
        return z;
      }
      x -= 2;
      return z * rateval(x);
    }
    module.exports = gamma2;
  }
});

// node_modules/@stdlib/math-base-special-gamma/lib/index.js
var require_lib89 = __commonJS({
  "node_modules/@stdlib/math-base-special-gamma/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main62();
    module.exports = main;
  }
});

// node_modules/@stdlib/constants-float64-max-nth-factorial/lib/index.js
var require_lib90 = __commonJS({
  "node_modules/@stdlib/constants-float64-max-nth-factorial/lib/index.js"(exports, module) {
    "use strict";
    var FLOAT64_MAX_NTH_FACTORIAL = 170 | 0;
    module.exports = FLOAT64_MAX_NTH_FACTORIAL;
  }
});

// node_modules/@stdlib/math-base-special-factorial/lib/factorials.json
var require_factorials = __commonJS({
  "node_modules/@stdlib/math-base-special-factorial/lib/factorials.json"(exports, module) {
    module.exports = [
      1,
      1,
      2,
      6,
      24,
      120,
      720,
      5040,
      40320,
      362880,
      3628800,
      39916800,
      479001600,
      6227020800,
      87178291200,
      1307674368e3,
      20922789888e3,
      355687428096e3,
      6402373705728e3,
      121645100408832e3,
      243290200817664e4,
      5109094217170944e4,
      11240007277776077e5,
      2585201673888498e7,
      6204484017332394e8,
      15511210043330986e9,
      40329146112660565e10,
      10888869450418352e12,
      30488834461171387e13,
      8841761993739702e15,
      26525285981219107e16,
      8222838654177922e18,
      2631308369336935e20,
      8683317618811886e21,
      29523279903960416e22,
      10333147966386145e24,
      37199332678990125e25,
      13763753091226346e27,
      5230226174666011e29,
      20397882081197444e30,
      8159152832478977e32,
      3345252661316381e34,
      140500611775288e37,
      6041526306337383e37,
      2658271574788449e39,
      11962222086548019e40,
      5502622159812089e42,
      25862324151116818e43,
      12413915592536073e45,
      6082818640342675e47,
      30414093201713376e48,
      15511187532873822e50,
      8065817517094388e52,
      42748832840600255e53,
      2308436973392414e56,
      12696403353658276e57,
      7109985878048635e59,
      40526919504877214e60,
      23505613312828785e62,
      13868311854568984e64,
      832098711274139e67,
      5075802138772248e68,
      3146997326038794e70,
      198260831540444e73,
      12688693218588417e73,
      8247650592082472e75,
      5443449390774431e77,
      3647111091818868e79,
      24800355424368305e80,
      1711224524281413e83,
      11978571669969892e84,
      8504785885678623e86,
      61234458376886085e87,
      44701154615126844e89,
      3307885441519386e92,
      248091408113954e95,
      18854947016660504e95,
      14518309202828587e97,
      11324281178206297e99,
      8946182130782976e101,
      7156945704626381e103,
      5797126020747368e105,
      4753643337012842e107,
      3945523969720659e109,
      3314240134565353e111,
      281710411438055e114,
      24227095383672734e114,
      2107757298379528e117,
      18548264225739844e118,
      1650795516090846e121,
      14857159644817615e122,
      1352001527678403e125,
      12438414054641308e126,
      11567725070816416e128,
      1087366156656743e131,
      1032997848823906e133,
      9916779348709496e134,
      9619275968248212e136,
      9426890448883248e138,
      9332621544394415e140,
      9332621544394415e142,
      942594775983836e145,
      9614466715035127e146,
      990290071648618e149,
      10299016745145628e150,
      1081396758240291e153,
      11462805637347084e154,
      1226520203196138e157,
      1324641819451829e159,
      14438595832024937e160,
      1588245541522743e163,
      17629525510902446e164,
      1974506857221074e167,
      22311927486598138e168,
      25435597334721877e170,
      2925093693493016e173,
      3393108684451898e175,
      3969937160808721e177,
      4684525849754291e179,
      5574585761207606e181,
      6689502913449127e183,
      8094298525273444e185,
      9875044200833601e187,
      1214630436702533e190,
      1506141741511141e192,
      1882677176888926e194,
      2372173242880047e196,
      30126600184576594e197,
      3856204823625804e200,
      4974504222477287e202,
      6466855489220474e204,
      847158069087882e207,
      11182486511960043e208,
      14872707060906857e210,
      19929427461615188e212,
      26904727073180504e214,
      3659042881952549e217,
      5012888748274992e219,
      6917786472619489e221,
      9615723196941089e223,
      13462012475717526e225,
      1898143759076171e228,
      2695364137888163e230,
      3854370717180073e232,
      55502938327393044e233,
      8047926057471992e236,
      11749972043909107e238,
      1727245890454639e241,
      25563239178728654e242,
      380892263763057e246,
      5713383956445855e247,
      862720977423324e250,
      13113358856834524e251,
      20063439050956823e253,
      30897696138473508e255,
      4789142901463394e258,
      7471062926282894e260,
      11729568794264145e262,
      1853271869493735e265,
      29467022724950384e266,
      47147236359920616e268,
      7590705053947219e271,
      12296942187394494e273,
      20044015765453026e275,
      3287218585534296e278,
      5423910666131589e280,
      9003691705778438e282,
      1503616514864999e285,
      25260757449731984e286,
      4269068009004705e289,
      7257415615307999e291
    ];
  }
});

// node_modules/@stdlib/math-base-special-factorial/lib/main.js
var require_main63 = __commonJS({
  "node_modules/@stdlib/math-base-special-factorial/lib/main.js"(exports, module) {
    "use strict";
    var isnan = require_lib6();
    var isInteger = require_lib59();
    var gamma2 = require_lib89();
    var PINF = require_lib31();
    var FLOAT64_MAX_NTH_FACTORIAL = require_lib90();
    var FACTORIALS = require_factorials();
    function factorial(x) {
      if (isnan(x)) {
        return NaN;
      }
      if (isInteger(x)) {
        if (x < 0) {
          return NaN;
        }
        if (x <= FLOAT64_MAX_NTH_FACTORIAL) {
          return FACTORIALS[x];
        }
        return PINF;
      }
      return gamma2(x + 1);
    }
    module.exports = factorial;
  }
});

// node_modules/@stdlib/math-base-special-factorial/lib/index.js
var require_lib91 = __commonJS({
  "node_modules/@stdlib/math-base-special-factorial/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main63();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-special-gamma-lanczos-sum/lib/rational_pq.js
var require_rational_pq3 = __commonJS({
  "node_modules/@stdlib/math-base-special-gamma-lanczos-sum/lib/rational_pq.js"(exports, module) {
    "use strict";
    function evalrational(x) {
      var ax;
      var s1;
      var s2;
      if (x === 0) {
        return Infinity;
      }
      if (x < 0) {
        ax = -x;
      } else {
        ax = x;
      }
      if (ax <= 1) {
        s1 = 3847467039331777e-5 + x * (3685766504351951e-5 + x * (1588920245372942e-5 + x * (4059208354298835e-6 + x * (6805476611834733e-7 + x * (7823975500312005e-8 + x * (6246580776401795e-9 + x * (341986.3488721347 + x * (12287.194511824551 + x * (261.61404416416684 + x * 2.5066282746310007)))))))));
        s2 = 0 + x * (362880 + x * (1026576 + x * (1172700 + x * (723680 + x * (269325 + x * (63273 + x * (9450 + x * (870 + x * (45 + x * 1)))))))));
      } else {
        x = 1 / x;
        s1 = 2.5066282746310007 + x * (261.61404416416684 + x * (12287.194511824551 + x * (341986.3488721347 + x * (6246580776401795e-9 + x * (7823975500312005e-8 + x * (6805476611834733e-7 + x * (4059208354298835e-6 + x * (1588920245372942e-5 + x * (3685766504351951e-5 + x * 3847467039331777e-5)))))))));
        s2 = 1 + x * (45 + x * (870 + x * (9450 + x * (63273 + x * (269325 + x * (723680 + x * (1172700 + x * (1026576 + x * (362880 + x * 0)))))))));
      }
      return s1 / s2;
    }
    module.exports = evalrational;
  }
});

// node_modules/@stdlib/math-base-special-gamma-lanczos-sum/lib/main.js
var require_main64 = __commonJS({
  "node_modules/@stdlib/math-base-special-gamma-lanczos-sum/lib/main.js"(exports, module) {
    "use strict";
    var gammaLanczosSum = require_rational_pq3();
    module.exports = gammaLanczosSum;
  }
});

// node_modules/@stdlib/math-base-special-gamma-lanczos-sum/lib/index.js
var require_lib92 = __commonJS({
  "node_modules/@stdlib/math-base-special-gamma-lanczos-sum/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main64();
    module.exports = main;
  }
});

// node_modules/@stdlib/constants-float64-gamma-lanczos-g/lib/index.js
var require_lib93 = __commonJS({
  "node_modules/@stdlib/constants-float64-gamma-lanczos-g/lib/index.js"(exports, module) {
    "use strict";
    var FLOAT64_GAMMA_LANCZOS_G = 10.900511;
    module.exports = FLOAT64_GAMMA_LANCZOS_G;
  }
});

// node_modules/@stdlib/math-base-special-gamma-delta-ratio/lib/gamma_delta_ratio_lanczos.js
var require_gamma_delta_ratio_lanczos = __commonJS({
  "node_modules/@stdlib/math-base-special-gamma-delta-ratio/lib/gamma_delta_ratio_lanczos.js"(exports, module) {
    "use strict";
    var lanczosSum = require_lib92();
    var gamma2 = require_lib89();
    var log1p = require_lib38();
    var abs = require_lib42();
    var exp9 = require_lib58();
    var pow = require_lib67();
    var EPSILON = require_lib69();
    var E = require_lib68();
    var G = require_lib93();
    var FLOAT64_MAX_NTH_FACTORIAL = require_lib90();
    var FACTORIAL_169 = 4269068009004705e289;
    function gammaDeltaRatioLanczos(z, delta) {
      var result;
      var ratio;
      var zgh;
      if (z < EPSILON) {
        if (delta >= FLOAT64_MAX_NTH_FACTORIAL) {
          ratio = gammaDeltaRatioLanczos(delta, FLOAT64_MAX_NTH_FACTORIAL - delta);
          ratio *= z;
          ratio *= FACTORIAL_169;
          return 1 / ratio;
        }
        return 1 / (z * gamma2(z + delta));
      }
      zgh = z + G - 0.5;
      if (z + delta === z) {
        if (abs(delta / zgh) < EPSILON) {
          result = exp9(-delta);
        } else {
          result = 1;
        }
      } else {
        if (abs(delta) < 10) {
          result = exp9((0.5 - z) * log1p(delta / zgh));
        } else {
          result = pow(zgh / (zgh + delta), z - 0.5);
        }
        result *= lanczosSum(z) / lanczosSum(z + delta);
      }
      result *= pow(E / (zgh + delta), delta);
      return result;
    }
    module.exports = gammaDeltaRatioLanczos;
  }
});

// node_modules/@stdlib/math-base-special-gamma-delta-ratio/lib/main.js
var require_main65 = __commonJS({
  "node_modules/@stdlib/math-base-special-gamma-delta-ratio/lib/main.js"(exports, module) {
    "use strict";
    var abs = require_lib42();
    var floor = require_lib37();
    var gamma2 = require_lib89();
    var factorial = require_lib91();
    var FLOAT64_MAX_NTH_FACTORIAL = require_lib90();
    var gammaDeltaRatioLanczos = require_gamma_delta_ratio_lanczos();
    function gammaDeltaRatio(z, delta) {
      var result;
      var idelta;
      var iz;
      if (z <= 0 || z + delta <= 0) {
        return gamma2(z) / gamma2(z + delta);
      }
      idelta = floor(delta);
      if (idelta === delta) {
        iz = floor(z);
        if (iz === z) {
          if (z <= FLOAT64_MAX_NTH_FACTORIAL && z + delta <= FLOAT64_MAX_NTH_FACTORIAL) {
            return factorial(iz - 1) / factorial(idelta + iz - 1);
          }
        }
        if (abs(delta) < 20) {
          if (delta === 0) {
            return 1;
          }
          if (delta < 0) {
            z -= 1;
            result = z;
            delta += 1;
            while (delta !== 0) {
              z -= 1;
              result *= z;
              delta += 1;
            }
            return result;
          }
          result = 1 / z;
          delta -= 1;
          while (delta !== 0) {
            z += 1;
            result /= z;
            delta -= 1;
          }
          return result;
        }
      }
      return gammaDeltaRatioLanczos(z, delta);
    }
    module.exports = gammaDeltaRatio;
  }
});

// node_modules/@stdlib/math-base-special-gamma-delta-ratio/lib/index.js
var require_lib94 = __commonJS({
  "node_modules/@stdlib/math-base-special-gamma-delta-ratio/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main65();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-special-ln/lib/polyval_p.js
var require_polyval_p3 = __commonJS({
  "node_modules/@stdlib/math-base-special-ln/lib/polyval_p.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return 0.3999999999940942;
      }
      return 0.3999999999940942 + x * (0.22222198432149784 + x * 0.15313837699209373);
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-ln/lib/polyval_q.js
var require_polyval_q2 = __commonJS({
  "node_modules/@stdlib/math-base-special-ln/lib/polyval_q.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return 0.6666666666666735;
      }
      return 0.6666666666666735 + x * (0.2857142874366239 + x * (0.1818357216161805 + x * 0.14798198605116586));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-ln/lib/main.js
var require_main66 = __commonJS({
  "node_modules/@stdlib/math-base-special-ln/lib/main.js"(exports, module) {
    "use strict";
    var getHighWord = require_lib28();
    var setHighWord = require_lib29();
    var isnan = require_lib6();
    var BIAS = require_lib34();
    var NINF = require_lib33();
    var polyvalP = require_polyval_p3();
    var polyvalQ = require_polyval_q2();
    var LN2_HI = 0.6931471803691238;
    var LN2_LO = 19082149292705877e-26;
    var TWO54 = 18014398509481984;
    var ONE_THIRD = 0.3333333333333333;
    var HIGH_SIGNIFICAND_MASK = 1048575 | 0;
    var HIGH_MAX_NORMAL_EXP = 2146435072 | 0;
    var HIGH_MIN_NORMAL_EXP = 1048576 | 0;
    var HIGH_BIASED_EXP_0 = 1072693248 | 0;
    function ln9(x) {
      var hfsq;
      var hx;
      var t2;
      var t1;
      var k;
      var R;
      var f;
      var i;
      var j;
      var s;
      var w;
      var z;
      if (x === 0) {
        return NINF;
      }
      if (isnan(x) || x < 0) {
        return NaN;
      }
      hx = getHighWord(x);
      k = 0 | 0;
      if (hx < HIGH_MIN_NORMAL_EXP) {
        k -= 54 | 0;
        x *= TWO54;
        hx = getHighWord(x);
      }
      if (hx >= HIGH_MAX_NORMAL_EXP) {
        return x + x;
      }
      k += (hx >> 20) - BIAS | 0;
      hx &= HIGH_SIGNIFICAND_MASK;
      i = hx + 614244 & 1048576 | 0;
      x = setHighWord(x, hx | i ^ HIGH_BIASED_EXP_0);
      k += i >> 20 | 0;
      f = x - 1;
      if ((HIGH_SIGNIFICAND_MASK & 2 + hx) < 3) {
        if (f === 0) {
          if (k === 0) {
            return 0;
          }
          return k * LN2_HI + k * LN2_LO;
        }
        R = f * f * (0.5 - ONE_THIRD * f);
        if (k === 0) {
          return f - R;
        }
        return k * LN2_HI - (R - k * LN2_LO - f);
      }
      s = f / (2 + f);
      z = s * s;
      i = hx - 398458 | 0;
      w = z * z;
      j = 440401 - hx | 0;
      t1 = w * polyvalP(w);
      t2 = z * polyvalQ(w);
      i |= j;
      R = t2 + t1;
      if (i > 0) {
        hfsq = 0.5 * f * f;
        if (k === 0) {
          return f - (hfsq - s * (hfsq + R));
        }
        return k * LN2_HI - (hfsq - (s * (hfsq + R) + k * LN2_LO) - f);
      }
      if (k === 0) {
        return f - s * (f - R);
      }
      return k * LN2_HI - (s * (f - R) - k * LN2_LO - f);
    }
    module.exports = ln9;
  }
});

// node_modules/@stdlib/math-base-special-ln/lib/index.js
var require_lib95 = __commonJS({
  "node_modules/@stdlib/math-base-special-ln/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main66();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-special-cos/lib/main.js
var require_main67 = __commonJS({
  "node_modules/@stdlib/math-base-special-cos/lib/main.js"(exports, module) {
    "use strict";
    var getHighWord = require_lib28();
    var kernelCos = require_lib79();
    var kernelSin = require_lib80();
    var rempio2 = require_lib85();
    var ABS_MASK = require_lib50();
    var EXPONENT_MASK = require_lib55();
    var buffer = [0, 0];
    var HIGH_WORD_PIO4 = 1072243195 | 0;
    var HIGH_WORD_TWO_NEG_27 = 1044381696 | 0;
    function cos(x) {
      var ix;
      var n;
      ix = getHighWord(x);
      ix &= ABS_MASK;
      if (ix <= HIGH_WORD_PIO4) {
        if (ix < HIGH_WORD_TWO_NEG_27) {
          return 1;
        }
        return kernelCos(x, 0);
      }
      if (ix >= EXPONENT_MASK) {
        return NaN;
      }
      n = rempio2(x, buffer);
      switch (n & 3) {
        case 0:
          return kernelCos(buffer[0], buffer[1]);
        case 1:
          return -kernelSin(buffer[0], buffer[1]);
        case 2:
          return -kernelCos(buffer[0], buffer[1]);
        default:
          return kernelSin(buffer[0], buffer[1]);
      }
    }
    module.exports = cos;
  }
});

// node_modules/@stdlib/math-base-special-cos/lib/index.js
var require_lib96 = __commonJS({
  "node_modules/@stdlib/math-base-special-cos/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main67();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-special-sinpi/lib/main.js
var require_main68 = __commonJS({
  "node_modules/@stdlib/math-base-special-sinpi/lib/main.js"(exports, module) {
    "use strict";
    var isnan = require_lib6();
    var isInfinite = require_lib48();
    var cos = require_lib96();
    var sin = require_lib86();
    var abs = require_lib42();
    var copysign = require_lib52();
    var PI = require_lib78();
    function sinpi(x) {
      var ar;
      var r;
      if (isnan(x)) {
        return NaN;
      }
      if (isInfinite(x)) {
        return NaN;
      }
      r = x % 2;
      ar = abs(r);
      if (ar === 0 || ar === 1) {
        return copysign(0, r);
      }
      if (ar < 0.25) {
        return sin(PI * r);
      }
      if (ar < 0.75) {
        ar = 0.5 - ar;
        return copysign(cos(PI * ar), r);
      }
      if (ar < 1.25) {
        r = copysign(1, r) - r;
        return sin(PI * r);
      }
      if (ar < 1.75) {
        ar -= 1.5;
        return -copysign(cos(PI * ar), r);
      }
      r -= copysign(2, r);
      return sin(PI * r);
    }
    module.exports = sinpi;
  }
});

// node_modules/@stdlib/math-base-special-sinpi/lib/index.js
var require_lib97 = __commonJS({
  "node_modules/@stdlib/math-base-special-sinpi/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main68();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-special-gammaln/lib/polyval_a1.js
var require_polyval_a1 = __commonJS({
  "node_modules/@stdlib/math-base-special-gammaln/lib/polyval_a1.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return 0.06735230105312927;
      }
      return 0.06735230105312927 + x * (0.007385550860814029 + x * (0.0011927076318336207 + x * (22086279071390839e-20 + x * 25214456545125733e-21)));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-gammaln/lib/polyval_a2.js
var require_polyval_a2 = __commonJS({
  "node_modules/@stdlib/math-base-special-gammaln/lib/polyval_a2.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return 0.020580808432516733;
      }
      return 0.020580808432516733 + x * (0.0028905138367341563 + x * (5100697921535113e-19 + x * (10801156724758394e-20 + x * 44864094961891516e-21)));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-gammaln/lib/polyval_r.js
var require_polyval_r = __commonJS({
  "node_modules/@stdlib/math-base-special-gammaln/lib/polyval_r.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return 1.3920053346762105;
      }
      return 1.3920053346762105 + x * (0.7219355475671381 + x * (0.17193386563280308 + x * (0.01864591917156529 + x * (7779424963818936e-19 + x * 7326684307446256e-21))));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-gammaln/lib/polyval_s.js
var require_polyval_s2 = __commonJS({
  "node_modules/@stdlib/math-base-special-gammaln/lib/polyval_s.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return 0.21498241596060885;
      }
      return 0.21498241596060885 + x * (0.325778796408931 + x * (0.14635047265246445 + x * (0.02664227030336386 + x * (0.0018402845140733772 + x * 3194753265841009e-20))));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-gammaln/lib/polyval_t1.js
var require_polyval_t1 = __commonJS({
  "node_modules/@stdlib/math-base-special-gammaln/lib/polyval_t1.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return -0.032788541075985965;
      }
      return -0.032788541075985965 + x * (0.006100538702462913 + x * (-0.0014034646998923284 + x * 31563207090362595e-20));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-gammaln/lib/polyval_t2.js
var require_polyval_t2 = __commonJS({
  "node_modules/@stdlib/math-base-special-gammaln/lib/polyval_t2.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return 0.01797067508118204;
      }
      return 0.01797067508118204 + x * (-0.0036845201678113826 + x * (881081882437654e-18 + x * -31275416837512086e-20));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-gammaln/lib/polyval_t3.js
var require_polyval_t3 = __commonJS({
  "node_modules/@stdlib/math-base-special-gammaln/lib/polyval_t3.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return -0.010314224129834144;
      }
      return -0.010314224129834144 + x * (0.0022596478090061247 + x * (-5385953053567405e-19 + x * 3355291926355191e-19));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-gammaln/lib/polyval_u.js
var require_polyval_u = __commonJS({
  "node_modules/@stdlib/math-base-special-gammaln/lib/polyval_u.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return 0.6328270640250934;
      }
      return 0.6328270640250934 + x * (1.4549225013723477 + x * (0.9777175279633727 + x * (0.22896372806469245 + x * 0.013381091853678766)));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-gammaln/lib/polyval_v.js
var require_polyval_v = __commonJS({
  "node_modules/@stdlib/math-base-special-gammaln/lib/polyval_v.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return 2.4559779371304113;
      }
      return 2.4559779371304113 + x * (2.128489763798934 + x * (0.7692851504566728 + x * (0.10422264559336913 + x * 0.003217092422824239)));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-gammaln/lib/polyval_w.js
var require_polyval_w2 = __commonJS({
  "node_modules/@stdlib/math-base-special-gammaln/lib/polyval_w.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return 0.08333333333333297;
      }
      return 0.08333333333333297 + x * (-0.0027777777772877554 + x * (7936505586430196e-19 + x * (-59518755745034e-17 + x * (8363399189962821e-19 + x * -0.0016309293409657527))));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-gammaln/lib/main.js
var require_main69 = __commonJS({
  "node_modules/@stdlib/math-base-special-gammaln/lib/main.js"(exports, module) {
    "use strict";
    var isnan = require_lib6();
    var isInfinite = require_lib48();
    var abs = require_lib42();
    var ln9 = require_lib95();
    var trunc = require_lib44();
    var sinpi = require_lib97();
    var PI = require_lib78();
    var PINF = require_lib31();
    var polyvalA1 = require_polyval_a1();
    var polyvalA2 = require_polyval_a2();
    var polyvalR = require_polyval_r();
    var polyvalS = require_polyval_s2();
    var polyvalT1 = require_polyval_t1();
    var polyvalT2 = require_polyval_t2();
    var polyvalT3 = require_polyval_t3();
    var polyvalU = require_polyval_u();
    var polyvalV = require_polyval_v();
    var polyvalW = require_polyval_w2();
    var A1C = 0.07721566490153287;
    var A2C = 0.3224670334241136;
    var RC = 1;
    var SC = -0.07721566490153287;
    var T1C = 0.48383612272381005;
    var T2C = -0.1475877229945939;
    var T3C = 0.06462494023913339;
    var UC = -0.07721566490153287;
    var VC = 1;
    var WC = 0.4189385332046727;
    var YMIN = 1.4616321449683622;
    var TWO52 = 4503599627370496;
    var TWO56 = 72057594037927940;
    var TINY = 13877787807814457e-33;
    var TC = 1.4616321449683622;
    var TF = -0.12148629053584961;
    var TT = -3638676997039505e-33;
    function gammaln(x) {
      var isNegative;
      var nadj;
      var flg;
      var p3;
      var p2;
      var p1;
      var p;
      var q;
      var t;
      var w;
      var y;
      var z;
      var r;
      if (isnan(x) || isInfinite(x)) {
        return x;
      }
      if (x === 0) {
        return PINF;
      }
      if (x < 0) {
        isNegative = true;
        x = -x;
      } else {
        isNegative = false;
      }
      if (x < TINY) {
        return -ln9(x);
      }
      if (isNegative) {
        if (x >= TWO52) {
          return PINF;
        }
        t = sinpi(x);
        if (t === 0) {
          return PINF;
        }
        nadj = ln9(PI / abs(t * x));
      }
      if (x === 1 || x === 2) {
        return 0;
      }
      if (x < 2) {
        if (x <= 0.9) {
          r = -ln9(x);
          if (x >= YMIN - 1 + 0.27) {
            y = 1 - x;
            flg = 0;
          } else if (x >= YMIN - 1 - 0.27) {
            y = x - (TC - 1);
            flg = 1;
          } else {
            y = x;
            flg = 2;
          }
        } else {
          r = 0;
          if (x >= YMIN + 0.27) {
            y = 2 - x;
            flg = 0;
          } else if (x >= YMIN - 0.27) {
            y = x - TC;
            flg = 1;
          } else {
            y = x - 1;
            flg = 2;
          }
        }
        switch (flg) {
          // eslint-disable-line default-case
          case 0:
            z = y * y;
            p1 = A1C + z * polyvalA1(z);
            p2 = z * (A2C + z * polyvalA2(z));
            p = y * p1 + p2;
            r += p - 0.5 * y;
            break;
          case 1:
            z = y * y;
            w = z * y;
            p1 = T1C + w * polyvalT1(w);
            p2 = T2C + w * polyvalT2(w);
            p3 = T3C + w * polyvalT3(w);
            p = z * p1 - (TT - w * (p2 + y * p3));
            r += TF + p;
            break;
          case 2:
            p1 = y * (UC + y * polyvalU(y));
            p2 = VC + y * polyvalV(y);
            r += -0.5 * y + p1 / p2;
            break;
        }
      } else if (x < 8) {
        flg = trunc(x);
        y = x - flg;
        p = y * (SC + y * polyvalS(y));
        q = RC + y * polyvalR(y);
        r = 0.5 * y + p / q;
        z = 1;
        switch (flg) {
          // eslint-disable-line default-case
          case 7:
            z *= y + 6;
          /* Falls through */
          case 6:
            z *= y + 5;
          /* Falls through */
          case 5:
            z *= y + 4;
          /* Falls through */
          case 4:
            z *= y + 3;
          /* Falls through */
          case 3:
            z *= y + 2;
            r += ln9(z);
        }
      } else if (x < TWO56) {
        t = ln9(x);
        z = 1 / x;
        y = z * z;
        w = WC + z * polyvalW(y);
        r = (x - 0.5) * (t - 1) + w;
      } else {
        r = x * (ln9(x) - 1);
      }
      if (isNegative) {
        r = nadj - r;
      }
      return r;
    }
    module.exports = gammaln;
  }
});

// node_modules/@stdlib/math-base-special-gammaln/lib/index.js
var require_lib98 = __commonJS({
  "node_modules/@stdlib/math-base-special-gammaln/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main69();
    module.exports = main;
  }
});

// node_modules/@stdlib/constants-float64-max-ln/lib/index.js
var require_lib99 = __commonJS({
  "node_modules/@stdlib/constants-float64-max-ln/lib/index.js"(exports, module) {
    "use strict";
    var FLOAT64_MAX_LN = 709.782712893384;
    module.exports = FLOAT64_MAX_LN;
  }
});

// node_modules/@stdlib/constants-float64-sqrt-eps/lib/index.js
var require_lib100 = __commonJS({
  "node_modules/@stdlib/constants-float64-sqrt-eps/lib/index.js"(exports, module) {
    "use strict";
    var FLOAT64_SQRT_EPSILON = 14901161193847656e-24;
    module.exports = FLOAT64_SQRT_EPSILON;
  }
});

// node_modules/@stdlib/utils-eval/lib/index.js
var require_lib101 = __commonJS({
  "node_modules/@stdlib/utils-eval/lib/index.js"(exports, module) {
    "use strict";
    var evil = eval;
    module.exports = evil;
  }
});

// node_modules/@stdlib/assert-has-generator-support/lib/main.js
var require_main70 = __commonJS({
  "node_modules/@stdlib/assert-has-generator-support/lib/main.js"(exports, module) {
    "use strict";
    var evil = require_lib101();
    function hasGeneratorSupport() {
      var bool;
      try {
        evil('"use strict"; (function* () {})');
        bool = true;
      } catch (err) {
        bool = false;
      }
      return bool;
    }
    module.exports = hasGeneratorSupport;
  }
});

// node_modules/@stdlib/assert-has-generator-support/lib/index.js
var require_lib102 = __commonJS({
  "node_modules/@stdlib/assert-has-generator-support/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main70();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-tools-sum-series/lib/generators.js
var require_generators = __commonJS({
  "node_modules/@stdlib/math-base-tools-sum-series/lib/generators.js"(exports, module) {
    "use strict";
    var abs = require_lib42();
    var EPS = require_lib69();
    var MAX_TERMS = 1e6;
    function sumSeries(generator, options) {
      var isgenerator;
      var tolerance;
      var nextTerm;
      var counter;
      var result;
      var opts;
      opts = {};
      if (arguments.length > 1) {
        opts = options;
      }
      tolerance = opts.tolerance || EPS;
      counter = opts.maxTerms || MAX_TERMS;
      result = opts.initialValue || 0;
      isgenerator = typeof generator.next === "function";
      if (isgenerator === true) {
        for (nextTerm of generator) {
          result += nextTerm;
          if (abs(tolerance * result) >= abs(nextTerm) || --counter === 0) {
            break;
          }
        }
      } else {
        do {
          nextTerm = generator();
          result += nextTerm;
        } while (abs(tolerance * result) < abs(nextTerm) && --counter);
      }
      return result;
    }
    module.exports = sumSeries;
  }
});

// node_modules/@stdlib/math-base-tools-sum-series/lib/basic.js
var require_basic = __commonJS({
  "node_modules/@stdlib/math-base-tools-sum-series/lib/basic.js"(exports, module) {
    "use strict";
    var abs = require_lib42();
    var EPS = require_lib69();
    var MAX_TERMS = 1e6;
    function sumSeries(generator, options) {
      var tolerance;
      var nextTerm;
      var counter;
      var result;
      var opts;
      opts = {};
      if (arguments.length > 1) {
        opts = options;
      }
      tolerance = opts.tolerance || EPS;
      counter = opts.maxTerms || MAX_TERMS;
      result = opts.initialValue || 0;
      do {
        nextTerm = generator();
        result += nextTerm;
      } while (abs(tolerance * result) < abs(nextTerm) && --counter);
      return result;
    }
    module.exports = sumSeries;
  }
});

// node_modules/@stdlib/math-base-tools-sum-series/lib/index.js
var require_lib103 = __commonJS({
  "node_modules/@stdlib/math-base-tools-sum-series/lib/index.js"(exports, module) {
    "use strict";
    var hasGeneratorSupport = require_lib102();
    var generator = require_generators();
    var basic = require_basic();
    var sumSeries;
    if (hasGeneratorSupport()) {
      sumSeries = generator;
    } else {
      sumSeries = basic;
    }
    module.exports = sumSeries;
  }
});

// node_modules/@stdlib/math-base-special-gammainc/lib/tgamma_i_large_x_series.js
var require_tgamma_i_large_x_series = __commonJS({
  "node_modules/@stdlib/math-base-special-gammainc/lib/tgamma_i_large_x_series.js"(exports, module) {
    "use strict";
    function tgammaILargeXSeries(a1, x1) {
      var result = 1;
      var a = a1;
      var x = x1;
      return next;
      function next() {
        var r = result;
        result *= a / x;
        a -= 1;
        return r;
      }
    }
    module.exports = tgammaILargeXSeries;
  }
});

// node_modules/@stdlib/math-base-special-gammainc/lib/tgamma_i_large_x.js
var require_tgamma_i_large_x = __commonJS({
  "node_modules/@stdlib/math-base-special-gammainc/lib/tgamma_i_large_x.js"(exports, module) {
    "use strict";
    var sumSeries = require_lib103();
    var tgammaILargeXSeries = require_tgamma_i_large_x_series();
    function tgammaILargeX(a, x) {
      var result;
      var s;
      s = tgammaILargeXSeries(a, x);
      result = sumSeries(s);
      return result;
    }
    module.exports = tgammaILargeX;
  }
});

// node_modules/@stdlib/math-base-special-gammainc/lib/finite_gamma_q.js
var require_finite_gamma_q = __commonJS({
  "node_modules/@stdlib/math-base-special-gammainc/lib/finite_gamma_q.js"(exports, module) {
    "use strict";
    var exp9 = require_lib58();
    function finiteGammaQ(a, x) {
      var term;
      var sum;
      var e;
      var n;
      e = exp9(-x);
      sum = e;
      if (sum !== 0) {
        term = sum;
        for (n = 1; n < a; ++n) {
          term /= n;
          term *= x;
          sum += term;
        }
      }
      return sum;
    }
    module.exports = finiteGammaQ;
  }
});

// node_modules/@stdlib/math-base-special-erfc/lib/polyval_pp.js
var require_polyval_pp = __commonJS({
  "node_modules/@stdlib/math-base-special-erfc/lib/polyval_pp.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return -0.3250421072470015;
      }
      return -0.3250421072470015 + x * (-0.02848174957559851 + x * (-0.005770270296489442 + x * -23763016656650163e-21));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-erfc/lib/polyval_qq.js
var require_polyval_qq = __commonJS({
  "node_modules/@stdlib/math-base-special-erfc/lib/polyval_qq.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return 0.39791722395915535;
      }
      return 0.39791722395915535 + x * (0.0650222499887673 + x * (0.005081306281875766 + x * (13249473800432164e-20 + x * -3960228278775368e-21)));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-erfc/lib/polyval_pa.js
var require_polyval_pa = __commonJS({
  "node_modules/@stdlib/math-base-special-erfc/lib/polyval_pa.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return 0.41485611868374833;
      }
      return 0.41485611868374833 + x * (-0.3722078760357013 + x * (0.31834661990116175 + x * (-0.11089469428239668 + x * (0.035478304325618236 + x * -0.002166375594868791))));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-erfc/lib/polyval_qa.js
var require_polyval_qa = __commonJS({
  "node_modules/@stdlib/math-base-special-erfc/lib/polyval_qa.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return 0.10642088040084423;
      }
      return 0.10642088040084423 + x * (0.540397917702171 + x * (0.07182865441419627 + x * (0.12617121980876164 + x * (0.01363708391202905 + x * 0.011984499846799107))));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-erfc/lib/polyval_ra.js
var require_polyval_ra = __commonJS({
  "node_modules/@stdlib/math-base-special-erfc/lib/polyval_ra.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return -0.6938585727071818;
      }
      return -0.6938585727071818 + x * (-10.558626225323291 + x * (-62.375332450326006 + x * (-162.39666946257347 + x * (-184.60509290671104 + x * (-81.2874355063066 + x * -9.814329344169145)))));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-erfc/lib/polyval_sa.js
var require_polyval_sa = __commonJS({
  "node_modules/@stdlib/math-base-special-erfc/lib/polyval_sa.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return 19.651271667439257;
      }
      return 19.651271667439257 + x * (137.65775414351904 + x * (434.56587747522923 + x * (645.3872717332679 + x * (429.00814002756783 + x * (108.63500554177944 + x * (6.570249770319282 + x * -0.0604244152148581))))));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-erfc/lib/polyval_rb.js
var require_polyval_rb = __commonJS({
  "node_modules/@stdlib/math-base-special-erfc/lib/polyval_rb.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return -0.799283237680523;
      }
      return -0.799283237680523 + x * (-17.757954917754752 + x * (-160.63638485582192 + x * (-637.5664433683896 + x * (-1025.0951316110772 + x * -483.5191916086514))));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-erfc/lib/polyval_sb.js
var require_polyval_sb = __commonJS({
  "node_modules/@stdlib/math-base-special-erfc/lib/polyval_sb.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return 30.33806074348246;
      }
      return 30.33806074348246 + x * (325.7925129965739 + x * (1536.729586084437 + x * (3199.8582195085955 + x * (2553.0504064331644 + x * (474.52854120695537 + x * -22.44095244658582)))));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-erfc/lib/main.js
var require_main71 = __commonJS({
  "node_modules/@stdlib/math-base-special-erfc/lib/main.js"(exports, module) {
    "use strict";
    var isnan = require_lib6();
    var exp9 = require_lib58();
    var setLowWord = require_lib62();
    var PINF = require_lib31();
    var NINF = require_lib33();
    var polyvalPP = require_polyval_pp();
    var polyvalQQ = require_polyval_qq();
    var polyvalPA = require_polyval_pa();
    var polyvalQA = require_polyval_qa();
    var polyvalRA = require_polyval_ra();
    var polyvalSA = require_polyval_sa();
    var polyvalRB = require_polyval_rb();
    var polyvalSB = require_polyval_sb();
    var TINY = 1e-300;
    var SMALL = 13877787807814457e-33;
    var ERX = 0.8450629115104675;
    var PPC = 0.12837916709551256;
    var QQC = 1;
    var PAC = -0.0023621185607526594;
    var QAC = 1;
    var RAC = -0.009864944034847148;
    var SAC = 1;
    var RBC = -0.0098649429247001;
    var SBC = 1;
    function erfc2(x) {
      var sign;
      var ax;
      var z;
      var r;
      var s;
      var y;
      var p;
      var q;
      if (isnan(x)) {
        return NaN;
      }
      if (x === PINF) {
        return 0;
      }
      if (x === NINF) {
        return 2;
      }
      if (x === 0) {
        return 1;
      }
      if (x < 0) {
        sign = true;
        ax = -x;
      } else {
        sign = false;
        ax = x;
      }
      if (ax < 0.84375) {
        if (ax < SMALL) {
          return 1 - x;
        }
        z = x * x;
        r = PPC + z * polyvalPP(z);
        s = QQC + z * polyvalQQ(z);
        y = r / s;
        if (x < 0.25) {
          return 1 - (x + x * y);
        }
        r = x * y;
        r += x - 0.5;
        return 0.5 - r;
      }
      if (ax < 1.25) {
        s = ax - 1;
        p = PAC + s * polyvalPA(s);
        q = QAC + s * polyvalQA(s);
        if (sign) {
          return 1 + ERX + p / q;
        }
        return 1 - ERX - p / q;
      }
      if (ax < 28) {
        s = 1 / (ax * ax);
        if (ax < 2.857142857142857) {
          r = RAC + s * polyvalRA(s);
          s = SAC + s * polyvalSA(s);
        } else {
          if (x < -6) {
            return 2 - TINY;
          }
          r = RBC + s * polyvalRB(s);
          s = SBC + s * polyvalSB(s);
        }
        z = setLowWord(ax, 0);
        r = exp9(-(z * z) - 0.5625) * exp9((z - ax) * (z + ax) + r / s);
        if (sign) {
          return 2 - r / ax;
        }
        return r / ax;
      }
      if (sign) {
        return 2 - TINY;
      }
      return TINY * TINY;
    }
    module.exports = erfc2;
  }
});

// node_modules/@stdlib/math-base-special-erfc/lib/index.js
var require_lib104 = __commonJS({
  "node_modules/@stdlib/math-base-special-erfc/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main71();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-special-gammainc/lib/finite_half_gamma_q.js
var require_finite_half_gamma_q = __commonJS({
  "node_modules/@stdlib/math-base-special-gammainc/lib/finite_half_gamma_q.js"(exports, module) {
    "use strict";
    var erfc2 = require_lib104();
    var sqrt = require_lib39();
    var exp9 = require_lib58();
    var PI = require_lib78();
    function finiteHalfGammaQ(a, x) {
      var half;
      var term;
      var sum;
      var e;
      var n;
      e = erfc2(sqrt(x));
      if (e !== 0 && a > 1) {
        term = exp9(-x) / sqrt(PI * x);
        term *= x;
        half = 0.5;
        term /= half;
        sum = term;
        for (n = 2; n < a; ++n) {
          term /= n - half;
          term *= x;
          sum += term;
        }
        e += sum;
      }
      return e;
    }
    module.exports = finiteHalfGammaQ;
  }
});

// node_modules/@stdlib/constants-float64-min-ln/lib/index.js
var require_lib105 = __commonJS({
  "node_modules/@stdlib/constants-float64-min-ln/lib/index.js"(exports, module) {
    "use strict";
    var FLOAT64_MIN_LN = -708.3964185322641;
    module.exports = FLOAT64_MIN_LN;
  }
});

// node_modules/@stdlib/math-base-special-gammainc/lib/full_igamma_prefix.js
var require_full_igamma_prefix = __commonJS({
  "node_modules/@stdlib/math-base-special-gammainc/lib/full_igamma_prefix.js"(exports, module) {
    "use strict";
    var exp9 = require_lib58();
    var pow = require_lib67();
    var ln9 = require_lib95();
    var MAX_LN = require_lib99();
    var MIN_LN = require_lib105();
    function fullIGammaPrefix(a, z) {
      var prefix;
      var alz;
      alz = a * ln9(z);
      if (z >= 1) {
        if (alz < MAX_LN && -z > MIN_LN) {
          prefix = pow(z, a) * exp9(-z);
        } else if (a >= 1) {
          prefix = pow(z / exp9(z / a), a);
        } else {
          prefix = exp9(alz - z);
        }
      } else {
        if (alz > MIN_LN) {
          prefix = pow(z, a) * exp9(-z);
        } else if (z / a < MAX_LN) {
          prefix = pow(z / exp9(z / a), a);
        } else {
          prefix = exp9(alz - z);
        }
      }
      return prefix;
    }
    module.exports = fullIGammaPrefix;
  }
});

// node_modules/@stdlib/math-base-tools-evalpoly/lib/main.js
var require_main72 = __commonJS({
  "node_modules/@stdlib/math-base-tools-evalpoly/lib/main.js"(exports, module) {
    "use strict";
    function evalpoly(c, x) {
      var p;
      var i;
      i = c.length;
      if (i < 2 || x === 0) {
        if (i === 0) {
          return 0;
        }
        return c[0];
      }
      i -= 1;
      p = c[i] * x + c[i - 1];
      i -= 2;
      while (i >= 0) {
        p = p * x + c[i];
        i -= 1;
      }
      return p;
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/function-ctor/lib/main.js
var require_main73 = __commonJS({
  "node_modules/@stdlib/function-ctor/lib/main.js"(exports, module) {
    "use strict";
    var Fcn = Function;
    module.exports = Fcn;
  }
});

// node_modules/@stdlib/function-ctor/lib/index.js
var require_lib106 = __commonJS({
  "node_modules/@stdlib/function-ctor/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main73();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-tools-evalpoly/lib/factory.js
var require_factory = __commonJS({
  "node_modules/@stdlib/math-base-tools-evalpoly/lib/factory.js"(exports, module) {
    "use strict";
    var Fcn = require_lib106();
    var evalpoly = require_main72();
    function factory(c) {
      var f;
      var n;
      var m;
      var i;
      if (c.length > 500) {
        return polyval;
      }
      f = "return function evalpoly(x){";
      n = c.length;
      if (n === 0) {
        f += "return 0.0;";
      } else if (n === 1) {
        f += "return " + c[0] + ";";
      } else {
        f += "if(x===0.0){return " + c[0] + ";}";
        f += "return " + c[0];
        m = n - 1;
        for (i = 1; i < n; i++) {
          f += "+x*";
          if (i < m) {
            f += "(";
          }
          f += c[i];
        }
        for (i = 0; i < m - 1; i++) {
          f += ")";
        }
        f += ";";
      }
      f += "}";
      f += "//# sourceURL=evalpoly.factory.js";
      return new Fcn(f)();
      function polyval(x) {
        return evalpoly(c, x);
      }
    }
    module.exports = factory;
  }
});

// node_modules/@stdlib/math-base-tools-evalpoly/lib/index.js
var require_lib107 = __commonJS({
  "node_modules/@stdlib/math-base-tools-evalpoly/lib/index.js"(exports, module) {
    "use strict";
    var setReadOnly = require_lib5();
    var main = require_main72();
    var factory = require_factory();
    setReadOnly(main, "factory", factory);
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-special-log1pmx/lib/log1p_series.js
var require_log1p_series = __commonJS({
  "node_modules/@stdlib/math-base-special-log1pmx/lib/log1p_series.js"(exports, module) {
    "use strict";
    function log1pSeries(x) {
      var mMult = -x;
      var mProd = -1;
      var k = 0;
      return next;
      function next() {
        mProd *= mMult;
        k += 1;
        return mProd / k;
      }
    }
    module.exports = log1pSeries;
  }
});

// node_modules/@stdlib/math-base-special-log1pmx/lib/main.js
var require_main74 = __commonJS({
  "node_modules/@stdlib/math-base-special-log1pmx/lib/main.js"(exports, module) {
    "use strict";
    var abs = require_lib42();
    var ln9 = require_lib95();
    var FLOAT_EPS = require_lib69();
    var sumSeries = require_lib103();
    var log1pSeries = require_log1p_series();
    function log1pmx2(x) {
      var opts;
      var ax;
      if (x <= -1) {
        return NaN;
      }
      ax = abs(x);
      if (ax > 0.95) {
        return ln9(1 + x) - x;
      }
      if (ax < FLOAT_EPS) {
        return -x * x / 2;
      }
      opts = {
        "initialValue": -x
      };
      return sumSeries(log1pSeries(x), opts);
    }
    module.exports = log1pmx2;
  }
});

// node_modules/@stdlib/math-base-special-log1pmx/lib/index.js
var require_lib108 = __commonJS({
  "node_modules/@stdlib/math-base-special-log1pmx/lib/index.js"(exports, module) {
    "use strict";
    var log1pmx2 = require_main74();
    module.exports = log1pmx2;
  }
});

// node_modules/@stdlib/constants-float64-two-pi/lib/index.js
var require_lib109 = __commonJS({
  "node_modules/@stdlib/constants-float64-two-pi/lib/index.js"(exports, module) {
    "use strict";
    var TWO_PI = 6.283185307179586;
    module.exports = TWO_PI;
  }
});

// node_modules/@stdlib/math-base-special-gammainc/lib/polyval_c0.js
var require_polyval_c0 = __commonJS({
  "node_modules/@stdlib/math-base-special-gammainc/lib/polyval_c0.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return -0.3333333333333333;
      }
      return -0.3333333333333333 + x * (0.08333333333333333 + x * (-0.014814814814814815 + x * (0.0011574074074074073 + x * (3527336860670194e-19 + x * (-1787551440329218e-19 + x * (3919263178522438e-20 + x * (-21854485106799924e-22 + x * (-185406221071516e-20 + x * (8296711340953087e-22 + x * (-17665952736826078e-23 + x * (6707853543401498e-24 + x * (10261809784240309e-24 + x * (-4382036018453353e-24 + x * 914769958223679e-24)))))))))))));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-gammainc/lib/polyval_c1.js
var require_polyval_c1 = __commonJS({
  "node_modules/@stdlib/math-base-special-gammainc/lib/polyval_c1.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return -0.001851851851851852;
      }
      return -0.001851851851851852 + x * (-0.003472222222222222 + x * (0.0026455026455026454 + x * (-9902263374485596e-19 + x * (20576131687242798e-20 + x * (-4018775720164609e-22 + x * (-18098550334489977e-21 + x * (764916091608111e-20 + x * (-16120900894563446e-22 + x * (4647127802807434e-24 + x * (1378633446915721e-22 + x * (-5752545603517705e-23 + x * 11951628599778148e-24)))))))))));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-gammainc/lib/polyval_c2.js
var require_polyval_c2 = __commonJS({
  "node_modules/@stdlib/math-base-special-gammainc/lib/polyval_c2.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return 0.004133597883597883;
      }
      return 0.004133597883597883 + x * (-0.0026813271604938273 + x * (7716049382716049e-19 + x * (20093878600823047e-22 + x * (-10736653226365161e-20 + x * (52923448829120125e-21 + x * (-12760635188618728e-21 + x * (3423578734096138e-23 + x * (13721957309062932e-22 + x * (-6298992138380055e-22 + x * 14280614206064242e-23)))))))));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-gammainc/lib/polyval_c3.js
var require_polyval_c3 = __commonJS({
  "node_modules/@stdlib/math-base-special-gammainc/lib/polyval_c3.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return 6494341563786008e-19;
      }
      return 6494341563786008e-19 + x * (22947209362139917e-20 + x * (-4691894943952557e-19 + x * (26772063206283885e-20 + x * (-7561801671883977e-20 + x * (-2396505113867297e-22 + x * (11082654115347302e-21 + x * (-56749528269915965e-22 + x * 14230900732435883e-22)))))));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-gammainc/lib/polyval_c4.js
var require_polyval_c4 = __commonJS({
  "node_modules/@stdlib/math-base-special-gammainc/lib/polyval_c4.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return -8618882909167117e-19;
      }
      return -8618882909167117e-19 + x * (7840392217200666e-19 + x * (-2990724803031902e-19 + x * (-14638452578843418e-22 + x * (6641498215465122e-20 + x * (-3968365047179435e-20 + x * 11375726970678419e-21)))));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-gammainc/lib/polyval_c5.js
var require_polyval_c5 = __commonJS({
  "node_modules/@stdlib/math-base-special-gammainc/lib/polyval_c5.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return -33679855336635813e-20;
      }
      return -33679855336635813e-20 + x * (-6972813758365858e-20 + x * (2772753244959392e-19 + x * (-19932570516188847e-20 + x * (6797780477937208e-20 + x * (1419062920643967e-22 + x * (-13594048189768693e-21 + x * (8018470256334202e-21 + x * -2291481176508095e-21)))))));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-gammainc/lib/polyval_c6.js
var require_polyval_c6 = __commonJS({
  "node_modules/@stdlib/math-base-special-gammainc/lib/polyval_c6.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return 5313079364639922e-19;
      }
      return 5313079364639922e-19 + x * (-5921664373536939e-19 + x * (2708782096718045e-19 + x * (7902353232660328e-22 + x * (-8153969367561969e-20 + x * (561168275310625e-19 + x * -18329116582843375e-21)))));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-gammainc/lib/polyval_c7.js
var require_polyval_c7 = __commonJS({
  "node_modules/@stdlib/math-base-special-gammainc/lib/polyval_c7.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return 34436760689237765e-20;
      }
      return 34436760689237765e-20 + x * (5171790908260592e-20 + x * (-33493161081142234e-20 + x * (2812695154763237e-19 + x * -10976582244684731e-20)));
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-gammainc/lib/polyval_c8.js
var require_polyval_c8 = __commonJS({
  "node_modules/@stdlib/math-base-special-gammainc/lib/polyval_c8.js"(exports, module) {
    "use strict";
    function evalpoly(x) {
      if (x === 0) {
        return -6526239185953094e-19;
      }
      return -6526239185953094e-19 + x * (8394987206720873e-19 + x * -438297098541721e-18);
    }
    module.exports = evalpoly;
  }
});

// node_modules/@stdlib/math-base-special-gammainc/lib/igamma_temme_large.js
var require_igamma_temme_large = __commonJS({
  "node_modules/@stdlib/math-base-special-gammainc/lib/igamma_temme_large.js"(exports, module) {
    "use strict";
    var evalpoly = require_lib107();
    var log1pmx2 = require_lib108();
    var erfc2 = require_lib104();
    var sqrt = require_lib39();
    var exp9 = require_lib58();
    var TWO_PI = require_lib109();
    var polyvalC0 = require_polyval_c0();
    var polyvalC1 = require_polyval_c1();
    var polyvalC2 = require_polyval_c2();
    var polyvalC3 = require_polyval_c3();
    var polyvalC4 = require_polyval_c4();
    var polyvalC5 = require_polyval_c5();
    var polyvalC6 = require_polyval_c6();
    var polyvalC7 = require_polyval_c7();
    var polyvalC8 = require_polyval_c8();
    var workspace = [0, 0, 0, 0, 0, 0, 0, 0, 0, 0];
    function igammaTemmeLarge(a, x) {
      var result;
      var sigma;
      var phi;
      var y;
      var z;
      sigma = (x - a) / a;
      phi = -log1pmx2(sigma);
      y = a * phi;
      z = sqrt(2 * phi);
      if (x < a) {
        z = -z;
      }
      workspace[0] = polyvalC0(z);
      workspace[1] = polyvalC1(z);
      workspace[2] = polyvalC2(z);
      workspace[3] = polyvalC3(z);
      workspace[4] = polyvalC4(z);
      workspace[5] = polyvalC5(z);
      workspace[6] = polyvalC6(z);
      workspace[7] = polyvalC7(z);
      workspace[8] = polyvalC8(z);
      workspace[9] = -5967612901927463e-19;
      result = evalpoly(workspace, 1 / a);
      result *= exp9(-y) / sqrt(TWO_PI * a);
      if (x < a) {
        result = -result;
      }
      result += erfc2(sqrt(y)) / 2;
      return result;
    }
    module.exports = igammaTemmeLarge;
  }
});

// node_modules/@stdlib/math-base-special-gammainc/lib/lower_incomplete_gamma_series.js
var require_lower_incomplete_gamma_series = __commonJS({
  "node_modules/@stdlib/math-base-special-gammainc/lib/lower_incomplete_gamma_series.js"(exports, module) {
    "use strict";
    function lowerIncompleteGammaSeries(a1, z1) {
      var result = 1;
      var a = a1;
      var z = z1;
      return next;
      function next() {
        var r = result;
        a += 1;
        result *= z / a;
        return r;
      }
    }
    module.exports = lowerIncompleteGammaSeries;
  }
});

// node_modules/@stdlib/math-base-special-gammainc/lib/lower_gamma_series.js
var require_lower_gamma_series = __commonJS({
  "node_modules/@stdlib/math-base-special-gammainc/lib/lower_gamma_series.js"(exports, module) {
    "use strict";
    var sumSeries = require_lib103();
    var lowerIncompleteGammaSeries = require_lower_incomplete_gamma_series();
    function lowerGammaSeries(a, z, initialValue) {
      var result;
      var s;
      initialValue = initialValue || 0;
      s = lowerIncompleteGammaSeries(a, z);
      result = sumSeries(s, {
        "initialValue": initialValue
      });
      return result;
    }
    module.exports = lowerGammaSeries;
  }
});

// node_modules/@stdlib/math-base-special-gamma-lanczos-sum-expg-scaled/lib/rational_pq.js
var require_rational_pq4 = __commonJS({
  "node_modules/@stdlib/math-base-special-gamma-lanczos-sum-expg-scaled/lib/rational_pq.js"(exports, module) {
    "use strict";
    function evalrational(x) {
      var ax;
      var s1;
      var s2;
      if (x === 0) {
        return Infinity;
      }
      if (x < 0) {
        ax = -x;
      } else {
        ax = x;
      }
      if (ax <= 1) {
        s1 = 709811.662581658 + x * (679979.8474157227 + x * (293136.7857211597 + x * (74887.54032914672 + x * (12555.290582413863 + x * (1443.4299244417066 + x * (115.24194596137347 + x * (6.309239205732627 + x * (0.22668404630224365 + x * (0.004826466289237662 + x * 4624429436045379e-20)))))))));
        s2 = 0 + x * (362880 + x * (1026576 + x * (1172700 + x * (723680 + x * (269325 + x * (63273 + x * (9450 + x * (870 + x * (45 + x * 1)))))))));
      } else {
        x = 1 / x;
        s1 = 4624429436045379e-20 + x * (0.004826466289237662 + x * (0.22668404630224365 + x * (6.309239205732627 + x * (115.24194596137347 + x * (1443.4299244417066 + x * (12555.290582413863 + x * (74887.54032914672 + x * (293136.7857211597 + x * (679979.8474157227 + x * 709811.662581658)))))))));
        s2 = 1 + x * (45 + x * (870 + x * (9450 + x * (63273 + x * (269325 + x * (723680 + x * (1172700 + x * (1026576 + x * (362880 + x * 0)))))))));
      }
      return s1 / s2;
    }
    module.exports = evalrational;
  }
});

// node_modules/@stdlib/math-base-special-gamma-lanczos-sum-expg-scaled/lib/main.js
var require_main75 = __commonJS({
  "node_modules/@stdlib/math-base-special-gamma-lanczos-sum-expg-scaled/lib/main.js"(exports, module) {
    "use strict";
    var gammaLanczosSumExpGScaled = require_rational_pq4();
    module.exports = gammaLanczosSumExpGScaled;
  }
});

// node_modules/@stdlib/math-base-special-gamma-lanczos-sum-expg-scaled/lib/index.js
var require_lib110 = __commonJS({
  "node_modules/@stdlib/math-base-special-gamma-lanczos-sum-expg-scaled/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main75();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-special-gammainc/lib/regularised_gamma_prefix.js
var require_regularised_gamma_prefix = __commonJS({
  "node_modules/@stdlib/math-base-special-gammainc/lib/regularised_gamma_prefix.js"(exports, module) {
    "use strict";
    var lanczosSumExpGScaled = require_lib110();
    var gammaln = require_lib98();
    var gamma2 = require_lib89();
    var log1pmx2 = require_lib108();
    var sqrt = require_lib39();
    var abs = require_lib42();
    var exp9 = require_lib58();
    var pow = require_lib67();
    var max = require_lib72();
    var min = require_lib74();
    var ln9 = require_lib95();
    var FLOAT64_MAX = require_lib75();
    var MAX_LN = require_lib99();
    var MIN_LN = require_lib105();
    var G = require_lib93();
    var E = require_lib68();
    function regularisedGammaPrefix(a, z) {
      var prefix;
      var amza;
      var agh;
      var alz;
      var amz;
      var sq;
      var d;
      agh = a + G - 0.5;
      d = (z - a - G + 0.5) / agh;
      if (a < 1) {
        if (z <= MIN_LN || a < 1 / FLOAT64_MAX) {
          return exp9(a * ln9(z) - z - gammaln(a));
        }
        return pow(z, a) * exp9(-z) / gamma2(a);
      }
      if (abs(d * d * a) <= 100 && a > 150) {
        prefix = a * log1pmx2(d) + z * (0.5 - G) / agh;
        prefix = exp9(prefix);
      } else {
        alz = a * ln9(z / agh);
        amz = a - z;
        if (min(alz, amz) <= MIN_LN || max(alz, amz) >= MAX_LN) {
          amza = amz / a;
          if (min(alz, amz) / 2 > MIN_LN && max(alz, amz) / 2 < MAX_LN) {
            sq = pow(z / agh, a / 2) * exp9(amz / 2);
            prefix = sq * sq;
          } else if (min(alz, amz) / 4 > MIN_LN && max(alz, amz) / 4 < MAX_LN && z > a) {
            sq = pow(z / agh, a / 4) * exp9(amz / 4);
            prefix = sq * sq;
            prefix *= prefix;
          } else if (amza > MIN_LN && amza < MAX_LN) {
            prefix = pow(z * exp9(amza) / agh, a);
          } else {
            prefix = exp9(alz + amz);
          }
        } else {
          prefix = pow(z / agh, a) * exp9(amz);
        }
      }
      prefix *= sqrt(agh / E) / lanczosSumExpGScaled(a);
      return prefix;
    }
    module.exports = regularisedGammaPrefix;
  }
});

// node_modules/@stdlib/math-base-special-powm1/lib/main.js
var require_main76 = __commonJS({
  "node_modules/@stdlib/math-base-special-powm1/lib/main.js"(exports, module) {
    "use strict";
    var isnan = require_lib6();
    var isinfinite = require_lib48();
    var abs = require_lib42();
    var expm1 = require_lib36();
    var ln9 = require_lib95();
    var pow = require_lib67();
    var trunc = require_lib44();
    function powm1(b, x) {
      var result;
      var y;
      if (isnan(b) || isnan(x)) {
        return NaN;
      }
      if (x === 0) {
        return 0;
      }
      if (b === 0) {
        return -1;
      }
      if (b < 0 && x % 2 === 0) {
        b = -b;
      }
      if (b > 0) {
        if (abs(x * (b - 1)) < 0.5 || abs(x) < 0.2) {
          y = ln9(b) * x;
          if (y < 0.5) {
            return expm1(y);
          }
        }
      } else if (trunc(x) !== x) {
        return NaN;
      }
      result = pow(b, x) - 1;
      if (isinfinite(result) || isnan(result)) {
        return NaN;
      }
      return result;
    }
    module.exports = powm1;
  }
});

// node_modules/@stdlib/math-base-special-powm1/lib/index.js
var require_lib111 = __commonJS({
  "node_modules/@stdlib/math-base-special-powm1/lib/index.js"(exports, module) {
    "use strict";
    var powm1 = require_main76();
    module.exports = powm1;
  }
});

// node_modules/@stdlib/math-base-special-gamma1pm1/lib/rational_p1q1.js
var require_rational_p1q1 = __commonJS({
  "node_modules/@stdlib/math-base-special-gamma1pm1/lib/rational_p1q1.js"(exports, module) {
    "use strict";
    function evalrational(x) {
      var ax;
      var s1;
      var s2;
      if (x === 0) {
        return -0.01803556856784494;
      }
      if (x < 0) {
        ax = -x;
      } else {
        ax = x;
      }
      if (ax <= 1) {
        s1 = -0.01803556856784494 + x * (0.02512664961998968 + x * (0.049410315156753225 + x * (0.0172491608709614 + x * (-2594535632054381e-19 + x * (-5410098692152044e-19 + x * (-3245886498259485e-20 + x * 0))))));
        s2 = 1 + x * (1.962029871977952 + x * (1.4801966942423133 + x * (0.5413914320717209 + x * (0.09885042511280101 + x * (0.008213096746488934 + x * (22493629192211576e-20 + x * -22335276320861708e-23))))));
      } else {
        x = 1 / x;
        s1 = 0 + x * (-3245886498259485e-20 + x * (-5410098692152044e-19 + x * (-2594535632054381e-19 + x * (0.0172491608709614 + x * (0.049410315156753225 + x * (0.02512664961998968 + x * -0.01803556856784494))))));
        s2 = -22335276320861708e-23 + x * (22493629192211576e-20 + x * (0.008213096746488934 + x * (0.09885042511280101 + x * (0.5413914320717209 + x * (1.4801966942423133 + x * (1.962029871977952 + x * 1))))));
      }
      return s1 / s2;
    }
    module.exports = evalrational;
  }
});

// node_modules/@stdlib/math-base-special-gamma1pm1/lib/rational_p2q2.js
var require_rational_p2q2 = __commonJS({
  "node_modules/@stdlib/math-base-special-gamma1pm1/lib/rational_p2q2.js"(exports, module) {
    "use strict";
    function evalrational(x) {
      var ax;
      var s1;
      var s2;
      if (x === 0) {
        return 0.04906224540690395;
      }
      if (x < 0) {
        ax = -x;
      } else {
        ax = x;
      }
      if (ax <= 1) {
        s1 = 0.04906224540690395 + x * (-0.09691175301595212 + x * (-0.4149833583594954 + x * (-0.4065671242119384 + x * (-0.1584135863906922 + x * (-0.024014982064857155 + x * -0.0010034668769627955)))));
        s2 = 1 + x * (3.0234982984646304 + x * (3.4873958536072385 + x * (1.9141558827442668 + x * (0.5071377386143635 + x * (0.05770397226904519 + x * 0.001957681026011072)))));
      } else {
        x = 1 / x;
        s1 = -0.0010034668769627955 + x * (-0.024014982064857155 + x * (-0.1584135863906922 + x * (-0.4065671242119384 + x * (-0.4149833583594954 + x * (-0.09691175301595212 + x * 0.04906224540690395)))));
        s2 = 0.001957681026011072 + x * (0.05770397226904519 + x * (0.5071377386143635 + x * (1.9141558827442668 + x * (3.4873958536072385 + x * (3.0234982984646304 + x * 1)))));
      }
      return s1 / s2;
    }
    module.exports = evalrational;
  }
});

// node_modules/@stdlib/math-base-special-gamma1pm1/lib/rational_p3q3.js
var require_rational_p3q3 = __commonJS({
  "node_modules/@stdlib/math-base-special-gamma1pm1/lib/rational_p3q3.js"(exports, module) {
    "use strict";
    function evalrational(x) {
      var ax;
      var s1;
      var s2;
      if (x === 0) {
        return -0.029232972183027003;
      }
      if (x < 0) {
        ax = -x;
      } else {
        ax = x;
      }
      if (ax <= 1) {
        s1 = -0.029232972183027003 + x * (0.14421626775719232 + x * (-0.14244039073863127 + x * (0.05428096940550536 + x * (-0.008505359768683364 + x * (4311713426792973e-19 + x * 0)))));
        s2 = 1 + x * (-1.5016935605448505 + x * (0.846973248876495 + x * (-0.22009515181499575 + x * (0.02558279715597587 + x * (-0.0010066679553914337 + x * -8271935218912905e-22)))));
      } else {
        x = 1 / x;
        s1 = 0 + x * (4311713426792973e-19 + x * (-0.008505359768683364 + x * (0.05428096940550536 + x * (-0.14244039073863127 + x * (0.14421626775719232 + x * -0.029232972183027003)))));
        s2 = -8271935218912905e-22 + x * (-0.0010066679553914337 + x * (0.02558279715597587 + x * (-0.22009515181499575 + x * (0.846973248876495 + x * (-1.5016935605448505 + x * 1)))));
      }
      return s1 / s2;
    }
    module.exports = evalrational;
  }
});

// node_modules/@stdlib/math-base-special-gamma1pm1/lib/lgamma_small_imp.js
var require_lgamma_small_imp = __commonJS({
  "node_modules/@stdlib/math-base-special-gamma1pm1/lib/lgamma_small_imp.js"(exports, module) {
    "use strict";
    var ln9 = require_lib95();
    var EPS = require_lib69();
    var rateval1 = require_rational_p1q1();
    var rateval2 = require_rational_p2q2();
    var rateval3 = require_rational_p3q3();
    var Y1 = 0.15896368026733398;
    var Y2 = 0.5281534194946289;
    var Y3 = 0.45201730728149414;
    function lgammaSmallImp(z, zm1, zm2) {
      var prefix;
      var result;
      var r;
      var R;
      if (z < EPS) {
        return -ln9(z);
      }
      if (zm1 === 0 || zm2 === 0) {
        return 0;
      }
      result = 0;
      if (z > 2) {
        if (z >= 3) {
          do {
            z -= 1;
            zm2 -= 1;
            result += ln9(z);
          } while (z >= 3);
          zm2 = z - 2;
        }
        r = zm2 * (z + 1);
        R = rateval1(zm2);
        result += r * Y1 + r * R;
        return result;
      }
      if (z < 1) {
        result += -ln9(z);
        zm2 = zm1;
        zm1 = z;
        z += 1;
      }
      if (z <= 1.5) {
        r = rateval2(zm1);
        prefix = zm1 * zm2;
        result += prefix * Y2 + prefix * r;
        return result;
      }
      r = zm2 * zm1;
      R = rateval3(-zm2);
      result += r * Y3 + r * R;
      return result;
    }
    module.exports = lgammaSmallImp;
  }
});

// node_modules/@stdlib/math-base-special-gamma1pm1/lib/main.js
var require_main77 = __commonJS({
  "node_modules/@stdlib/math-base-special-gamma1pm1/lib/main.js"(exports, module) {
    "use strict";
    var gamma2 = require_lib89();
    var expm1 = require_lib36();
    var log1p = require_lib38();
    var isnan = require_lib6();
    var lgammaSmallImp = require_lgamma_small_imp();
    function gamma1pm1(x) {
      if (isnan(x)) {
        return NaN;
      }
      if (x < 0) {
        if (x < -0.5) {
          return gamma2(1 + x) - 1;
        }
        return expm1(-log1p(x) + lgammaSmallImp(x + 2, x + 1, x));
      }
      if (x < 2) {
        return expm1(lgammaSmallImp(x + 1, x, x - 1));
      }
      return gamma2(1 + x) - 1;
    }
    module.exports = gamma1pm1;
  }
});

// node_modules/@stdlib/math-base-special-gamma1pm1/lib/index.js
var require_lib112 = __commonJS({
  "node_modules/@stdlib/math-base-special-gamma1pm1/lib/index.js"(exports, module) {
    "use strict";
    var gamma1pm1 = require_main77();
    module.exports = gamma1pm1;
  }
});

// node_modules/@stdlib/math-base-special-gammainc/lib/small_gamma2_series.js
var require_small_gamma2_series = __commonJS({
  "node_modules/@stdlib/math-base-special-gammainc/lib/small_gamma2_series.js"(exports, module) {
    "use strict";
    function smallGamma2Series(a, x) {
      var result;
      var apn;
      var n;
      var r;
      result = -x;
      x = -x;
      apn = a + 1;
      n = 1;
      return next;
      function next() {
        r = result / apn;
        result *= x;
        n += 1;
        result /= n;
        apn += 1;
        return r;
      }
    }
    module.exports = smallGamma2Series;
  }
});

// node_modules/@stdlib/math-base-special-gammainc/lib/tgamma_small_upper_part.js
var require_tgamma_small_upper_part = __commonJS({
  "node_modules/@stdlib/math-base-special-gammainc/lib/tgamma_small_upper_part.js"(exports, module) {
    "use strict";
    var powm1 = require_lib111();
    var sumSeries = require_lib103();
    var gamma1pm1 = require_lib112();
    var smallGamma2Series = require_small_gamma2_series();
    function tgammaSmallUpperPart(a, x, invert) {
      var initialValue;
      var result;
      var pgam;
      var p;
      var s;
      result = gamma1pm1(a);
      pgam = (result + 1) / a;
      p = powm1(x, a);
      result -= p;
      result /= a;
      s = smallGamma2Series(a, x);
      p += 1;
      initialValue = invert ? pgam : 0;
      result = -p * sumSeries(s, {
        "initialValue": (initialValue - result) / p
      });
      if (invert) {
        result = -result;
      }
      return [result, pgam];
    }
    module.exports = tgammaSmallUpperPart;
  }
});

// node_modules/@stdlib/constants-float32-smallest-normal/lib/index.js
var require_lib113 = __commonJS({
  "node_modules/@stdlib/constants-float32-smallest-normal/lib/index.js"(exports, module) {
    "use strict";
    var FLOAT32_SMALLEST_NORMAL = 11754943508222875e-54;
    module.exports = FLOAT32_SMALLEST_NORMAL;
  }
});

// node_modules/@stdlib/math-base-tools-continued-fraction/lib/generators.js
var require_generators2 = __commonJS({
  "node_modules/@stdlib/math-base-tools-continued-fraction/lib/generators.js"(exports, module) {
    "use strict";
    var abs = require_lib42();
    var FLOAT32_SMALLEST_NORMAL = require_lib113();
    var EPS = require_lib69();
    var MAX_ITER = 1e6;
    function continuedFractionA(gen, factor, maxIter) {
      var isgenerator;
      var delta;
      var a0;
      var f;
      var C;
      var D;
      var v;
      isgenerator = typeof gen.next === "function";
      v = isgenerator ? gen.next().value : gen();
      f = v[1];
      a0 = v[0];
      if (f === 0) {
        f = FLOAT32_SMALLEST_NORMAL;
      }
      C = f;
      D = 0;
      if (isgenerator === true) {
        do {
          v = gen.next().value;
          if (v) {
            D = v[1] + v[0] * D;
            if (D === 0) {
              D = FLOAT32_SMALLEST_NORMAL;
            }
            C = v[1] + v[0] / C;
            if (C === 0) {
              C = FLOAT32_SMALLEST_NORMAL;
            }
            D = 1 / D;
            delta = C * D;
            f *= delta;
          }
        } while (abs(delta - 1) > factor && --maxIter);
      } else {
        do {
          v = gen();
          if (v) {
            D = v[1] + v[0] * D;
            if (D === 0) {
              D = FLOAT32_SMALLEST_NORMAL;
            }
            C = v[1] + v[0] / C;
            if (C === 0) {
              C = FLOAT32_SMALLEST_NORMAL;
            }
            D = 1 / D;
            delta = C * D;
            f *= delta;
          }
        } while (v && abs(delta - 1) > factor && --maxIter);
      }
      return a0 / f;
    }
    function continuedFractionB(gen, factor, maxIter) {
      var isgenerator;
      var delta;
      var f;
      var C;
      var D;
      var v;
      isgenerator = typeof gen.next === "function";
      v = isgenerator ? gen.next().value : gen();
      f = v[1];
      if (f === 0) {
        f = FLOAT32_SMALLEST_NORMAL;
      }
      C = f;
      D = 0;
      if (isgenerator === true) {
        do {
          v = gen.next().value;
          if (v) {
            D = v[1] + v[0] * D;
            if (D === 0) {
              D = FLOAT32_SMALLEST_NORMAL;
            }
            C = v[1] + v[0] / C;
            if (C === 0) {
              C = FLOAT32_SMALLEST_NORMAL;
            }
            D = 1 / D;
            delta = C * D;
            f *= delta;
          }
        } while (v && abs(delta - 1) > factor && --maxIter);
      } else {
        do {
          v = gen();
          if (v) {
            D = v[1] + v[0] * D;
            if (D === 0) {
              D = FLOAT32_SMALLEST_NORMAL;
            }
            C = v[1] + v[0] / C;
            if (C === 0) {
              C = FLOAT32_SMALLEST_NORMAL;
            }
            D = 1 / D;
            delta = C * D;
            f *= delta;
          }
        } while (v && abs(delta - 1) > factor && --maxIter);
      }
      return f;
    }
    function continuedFraction(generator, options) {
      var maxIter;
      var opts;
      var eps;
      opts = {};
      if (arguments.length > 1) {
        opts = options;
      }
      maxIter = opts.maxIter || MAX_ITER;
      eps = opts.tolerance || EPS;
      if (opts.keep) {
        return continuedFractionB(generator, eps, maxIter);
      }
      return continuedFractionA(generator, eps, maxIter);
    }
    module.exports = continuedFraction;
  }
});

// node_modules/@stdlib/math-base-tools-continued-fraction/lib/basic.js
var require_basic2 = __commonJS({
  "node_modules/@stdlib/math-base-tools-continued-fraction/lib/basic.js"(exports, module) {
    "use strict";
    var abs = require_lib42();
    var EPS = require_lib69();
    var FLOAT32_SMALLEST_NORMAL = require_lib113();
    var MAX_ITER = 1e6;
    function continuedFractionA(gen, factor, maxIter) {
      var delta;
      var a0;
      var C;
      var D;
      var f;
      var v;
      v = gen();
      f = v[1];
      a0 = v[0];
      if (f === 0) {
        f = FLOAT32_SMALLEST_NORMAL;
      }
      C = f;
      D = 0;
      do {
        v = gen();
        if (v) {
          D = v[1] + v[0] * D;
          if (D === 0) {
            D = FLOAT32_SMALLEST_NORMAL;
          }
          C = v[1] + v[0] / C;
          if (C === 0) {
            C = FLOAT32_SMALLEST_NORMAL;
          }
          D = 1 / D;
          delta = C * D;
          f *= delta;
        }
      } while (v && abs(delta - 1) > factor && --maxIter);
      return a0 / f;
    }
    function continuedFractionB(gen, factor, maxIter) {
      var delta;
      var C;
      var D;
      var f;
      var v;
      v = gen();
      f = v[1];
      if (f === 0) {
        f = FLOAT32_SMALLEST_NORMAL;
      }
      C = f;
      D = 0;
      do {
        v = gen();
        if (v) {
          D = v[1] + v[0] * D;
          if (D === 0) {
            D = FLOAT32_SMALLEST_NORMAL;
          }
          C = v[1] + v[0] / C;
          if (C === 0) {
            C = FLOAT32_SMALLEST_NORMAL;
          }
          D = 1 / D;
          delta = C * D;
          f *= delta;
        }
      } while (v && abs(delta - 1) > factor && --maxIter);
      return f;
    }
    function continuedFraction(generator, options) {
      var maxIter;
      var opts;
      var eps;
      opts = {};
      if (arguments.length > 1) {
        opts = options;
      }
      eps = opts.tolerance || EPS;
      maxIter = opts.maxIter || MAX_ITER;
      if (opts.keep) {
        return continuedFractionB(generator, eps, maxIter);
      }
      return continuedFractionA(generator, eps, maxIter);
    }
    module.exports = continuedFraction;
  }
});

// node_modules/@stdlib/math-base-tools-continued-fraction/lib/index.js
var require_lib114 = __commonJS({
  "node_modules/@stdlib/math-base-tools-continued-fraction/lib/index.js"(exports, module) {
    "use strict";
    var hasGeneratorSupport = require_lib102();
    var generator = require_generators2();
    var basic = require_basic2();
    var continuedFraction;
    if (hasGeneratorSupport()) {
      continuedFraction = generator;
    } else {
      continuedFraction = basic;
    }
    module.exports = continuedFraction;
  }
});

// node_modules/@stdlib/math-base-special-gammainc/lib/upper_incomplete_gamma_fract.js
var require_upper_incomplete_gamma_fract = __commonJS({
  "node_modules/@stdlib/math-base-special-gammainc/lib/upper_incomplete_gamma_fract.js"(exports, module) {
    "use strict";
    function upperIncompleteGammaFract(a1, z1) {
      var z = z1 - a1 + 1;
      var a = a1;
      var k = 0;
      return next;
      function next() {
        k += 1;
        z += 2;
        return [
          k * (a - k),
          z
        ];
      }
    }
    module.exports = upperIncompleteGammaFract;
  }
});

// node_modules/@stdlib/math-base-special-gammainc/lib/upper_gamma_fraction.js
var require_upper_gamma_fraction = __commonJS({
  "node_modules/@stdlib/math-base-special-gammainc/lib/upper_gamma_fraction.js"(exports, module) {
    "use strict";
    var continuedFraction = require_lib114();
    var upperIncompleteGammaFract = require_upper_incomplete_gamma_fract();
    function upperGammaFraction(a, z) {
      var f = upperIncompleteGammaFract(a, z);
      return 1 / (z - a + 1 + continuedFraction(f));
    }
    module.exports = upperGammaFraction;
  }
});

// node_modules/@stdlib/math-base-special-gammainc/lib/igamma_final.js
var require_igamma_final = __commonJS({
  "node_modules/@stdlib/math-base-special-gammainc/lib/igamma_final.js"(exports, module) {
    "use strict";
    var floor = require_lib37();
    var gamma2 = require_lib89();
    var abs = require_lib42();
    var pow = require_lib67();
    var ln9 = require_lib95();
    var SQRT_EPSILON = require_lib100();
    var FLOAT64_MAX = require_lib75();
    var MAX_LN = require_lib99();
    var tgammaILargeX = require_tgamma_i_large_x();
    var finiteGammaQ = require_finite_gamma_q();
    var finiteHalfGammaQ = require_finite_half_gamma_q();
    var fullIGammaPrefix = require_full_igamma_prefix();
    var igammaTemmeLarge = require_igamma_temme_large();
    var lowerGammaSeries = require_lower_gamma_series();
    var regularisedGammaPrefix = require_regularised_gamma_prefix();
    var tgammaSmallUpperPart = require_tgamma_small_upper_part();
    var upperGammaFraction = require_upper_gamma_fraction();
    function igammaFinal(x, a, regularized, upper) {
      var optimisedInvert;
      var evalMethod;
      var isHalfInt;
      var initValue;
      var useTemme;
      var isSmallA;
      var result;
      var invert;
      var isInt;
      var sigma;
      var res;
      var gam;
      var fa;
      var g;
      result = 0;
      invert = upper;
      isSmallA = a < 30 && a <= x + 1 && x < MAX_LN;
      if (isSmallA) {
        fa = floor(a);
        isInt = fa === a;
        isHalfInt = isInt ? false : abs(fa - a) === 0.5;
      } else {
        isInt = false;
        isHalfInt = false;
      }
      if (isInt && x > 0.6) {
        invert = !invert;
        evalMethod = 0;
      } else if (isHalfInt && x > 0.2) {
        invert = !invert;
        evalMethod = 1;
      } else if (x < SQRT_EPSILON && a > 1) {
        evalMethod = 6;
      } else if (x > 1e3 && (a < x || abs(a - 50) / x < 1)) {
        invert = !invert;
        evalMethod = 7;
      } else if (x < 0.5) {
        if (-0.4 / ln9(x) < a) {
          evalMethod = 2;
        } else {
          evalMethod = 3;
        }
      } else if (x < 1.1) {
        if (x * 0.75 < a) {
          evalMethod = 2;
        } else {
          evalMethod = 3;
        }
      } else {
        useTemme = false;
        if (regularized && a > 20) {
          sigma = abs((x - a) / a);
          if (a > 200) {
            if (20 / a > sigma * sigma) {
              useTemme = true;
            }
          } else if (sigma < 0.4) {
            useTemme = true;
          }
        }
        if (useTemme) {
          evalMethod = 5;
        } else if (x - 1 / (3 * x) < a) {
          evalMethod = 2;
        } else {
          evalMethod = 4;
          invert = !invert;
        }
      }
      switch (evalMethod) {
        case 0:
          result = finiteGammaQ(a, x);
          if (regularized === false) {
            result *= gamma2(a);
          }
          break;
        case 1:
          result = finiteHalfGammaQ(a, x);
          if (regularized === false) {
            result *= gamma2(a);
          }
          break;
        case 2:
          result = regularized ? regularisedGammaPrefix(a, x) : fullIGammaPrefix(a, x);
          if (result !== 0) {
            initValue = 0;
            optimisedInvert = false;
            if (invert) {
              initValue = regularized ? 1 : gamma2(a);
              if (regularized || result >= 1 || FLOAT64_MAX * result > initValue) {
                initValue /= result;
                if (regularized || a < 1 || FLOAT64_MAX / a > initValue) {
                  initValue *= -a;
                  optimisedInvert = true;
                } else {
                  initValue = 0;
                }
              } else {
                initValue = 0;
              }
            }
            result *= lowerGammaSeries(a, x, initValue) / a;
            if (optimisedInvert) {
              invert = false;
              result = -result;
            }
          }
          break;
        case 3:
          invert = !invert;
          res = tgammaSmallUpperPart(a, x, invert);
          result = res[0];
          g = res[1];
          invert = false;
          if (regularized) {
            result /= g;
          }
          break;
        case 4:
          result = regularized ? regularisedGammaPrefix(a, x) : fullIGammaPrefix(a, x);
          if (result !== 0) {
            result *= upperGammaFraction(a, x);
          }
          break;
        case 5:
          result = igammaTemmeLarge(a, x);
          if (x >= a) {
            invert = !invert;
          }
          break;
        case 6:
          result = regularized ? pow(x, a) / gamma2(a + 1) : pow(x, a) / a;
          result *= 1 - a * x / (a + 1);
          break;
        case 7:
          result = regularized ? regularisedGammaPrefix(a, x) : fullIGammaPrefix(a, x);
          result /= x;
          if (result !== 0) {
            result *= tgammaILargeX(a, x);
          }
          break;
      }
      if (regularized && result > 1) {
        result = 1;
      }
      if (invert) {
        gam = regularized ? 1 : gamma2(a);
        result = gam - result;
      }
      return result;
    }
    module.exports = igammaFinal;
  }
});

// node_modules/@stdlib/math-base-special-gammainc/lib/main.js
var require_main78 = __commonJS({
  "node_modules/@stdlib/math-base-special-gammainc/lib/main.js"(exports, module) {
    "use strict";
    var gammaln = require_lib98();
    var exp9 = require_lib58();
    var ln9 = require_lib95();
    var SQRT_TWO_PI = require_lib87();
    var MAX_LN = require_lib99();
    var PINF = require_lib31();
    var FLOAT64_MAX_NTH_FACTORIAL = require_lib90();
    var igammaFinal = require_igamma_final();
    var lowerGammaSeries = require_lower_gamma_series();
    var upperGammaFraction = require_upper_gamma_fraction();
    function gammainc2(x, a, regularized, upper) {
      var normalized;
      var initValue;
      var invert;
      var result;
      if (x < 0 || a <= 0) {
        return NaN;
      }
      normalized = regularized === void 0 ? true : regularized;
      invert = upper;
      if (a >= FLOAT64_MAX_NTH_FACTORIAL && !normalized) {
        if (invert && a * 4 < x) {
          result = a * ln9(x) - x;
          result += ln9(upperGammaFraction(a, x));
        } else if (!invert && a > 4 * x) {
          result = a * ln9(x) - x;
          initValue = 0;
          result += ln9(lowerGammaSeries(a, x, initValue) / a);
        } else {
          result = igammaFinal(x, a, true, invert);
          if (result === 0) {
            if (invert) {
              result = 1 + 1 / (12 * a) + 1 / (288 * a * a);
              result = ln9(result) - a + (a - 0.5) * ln9(a);
              result += ln9(SQRT_TWO_PI);
            } else {
              result = a * ln9(x) - x;
              initValue = 0;
              result += ln9(lowerGammaSeries(a, x, initValue) / a);
            }
          } else {
            result = ln9(result) + gammaln(a);
          }
        }
        if (result > MAX_LN) {
          return PINF;
        }
        return exp9(result);
      }
      return igammaFinal(x, a, normalized, invert);
    }
    module.exports = gammainc2;
  }
});

// node_modules/@stdlib/math-base-special-gammainc/lib/index.js
var require_lib115 = __commonJS({
  "node_modules/@stdlib/math-base-special-gammainc/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main78();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-special-kernel-betainc/lib/full_igamma_prefix.js
var require_full_igamma_prefix2 = __commonJS({
  "node_modules/@stdlib/math-base-special-kernel-betainc/lib/full_igamma_prefix.js"(exports, module) {
    "use strict";
    var exp9 = require_lib58();
    var pow = require_lib67();
    var ln9 = require_lib95();
    var MAX_LN = require_lib99();
    var MIN_LN = require_lib105();
    function fullIGammaPrefix(a, z) {
      var prefix;
      var alz;
      alz = a * ln9(z);
      if (z >= 1) {
        if (alz < MAX_LN && -z > MIN_LN) {
          prefix = pow(z, a) * exp9(-z);
        } else if (a >= 1) {
          prefix = pow(z / exp9(z / a), a);
        } else {
          prefix = exp9(alz - z);
        }
      } else if (alz > MIN_LN) {
        prefix = pow(z, a) * exp9(-z);
      } else if (z / a < MAX_LN) {
        prefix = pow(z / exp9(z / a), a);
      } else {
        prefix = exp9(alz - z);
      }
      return prefix;
    }
    module.exports = fullIGammaPrefix;
  }
});

// node_modules/@stdlib/math-base-special-kernel-betainc/lib/regularized_gamma_prefix.js
var require_regularized_gamma_prefix = __commonJS({
  "node_modules/@stdlib/math-base-special-kernel-betainc/lib/regularized_gamma_prefix.js"(exports, module) {
    "use strict";
    var lanczosSumExpGScaled = require_lib110();
    var gammaln = require_lib98();
    var gamma2 = require_lib89();
    var log1p = require_lib38();
    var sqrt = require_lib39();
    var abs = require_lib42();
    var exp9 = require_lib58();
    var pow = require_lib67();
    var max = require_lib72();
    var min = require_lib74();
    var ln9 = require_lib95();
    var MAX_LN = require_lib99();
    var MIN_LN = require_lib105();
    var G = require_lib93();
    var E = require_lib68();
    function regularizedGammaPrefix(a, z) {
      var prefix;
      var amza;
      var agh;
      var alz;
      var amz;
      var sq;
      var d;
      agh = a + G - 0.5;
      d = (z - a - G + 0.5) / agh;
      if (a < 1) {
        if (z <= MIN_LN) {
          return exp9(a * ln9(z) - z - gammaln(a));
        }
        return pow(z, a) * exp9(-z) / gamma2(a);
      }
      if (abs(d * d * a) <= 100 && a > 150) {
        prefix = a * (log1p(d) - d) + z * (0.5 - G) / agh;
        prefix = exp9(prefix);
      } else {
        alz = a * ln9(z / agh);
        amz = a - z;
        if (min(alz, amz) <= MIN_LN || max(alz, amz) >= MAX_LN) {
          amza = amz / a;
          if (min(alz, amz) / 2 > MIN_LN && max(alz, amz) / 2 < MAX_LN) {
            sq = pow(z / agh, a / 2) * exp9(amz / 2);
            prefix = sq * sq;
          } else if (min(alz, amz) / 4 > MIN_LN && max(alz, amz) / 4 < MAX_LN && z > a) {
            sq = pow(z / agh, a / 4) * exp9(amz / 4);
            prefix = sq * sq;
            prefix *= prefix;
          } else if (amza > MIN_LN && amza < MAX_LN) {
            prefix = pow(z * exp9(amza) / agh, a);
          } else {
            prefix = exp9(alz + amz);
          }
        } else {
          prefix = pow(z / agh, a) * exp9(amz);
        }
      }
      prefix *= sqrt(agh / E) / lanczosSumExpGScaled(a);
      return prefix;
    }
    module.exports = regularizedGammaPrefix;
  }
});

// node_modules/@stdlib/math-base-special-kernel-betainc/lib/beta_small_b_large_a_series.js
var require_beta_small_b_large_a_series = __commonJS({
  "node_modules/@stdlib/math-base-special-kernel-betainc/lib/beta_small_b_large_a_series.js"(exports, module) {
    "use strict";
    var gammaDeltaRatio = require_lib94();
    var factorial = require_lib91();
    var gammainc2 = require_lib115();
    var log1p = require_lib38();
    var abs = require_lib42();
    var pow = require_lib67();
    var ln9 = require_lib95();
    var MIN_VALUE = require_lib53();
    var EPSILON = require_lib69();
    var fullIGammaPrefix = require_full_igamma_prefix2();
    var regularizedGammaPrefix = require_regularized_gamma_prefix();
    var p = new Array(30);
    function betaSmallBLargeASeries(a, b, x, y, s0, mult, normalized) {
      var prefix;
      var tmp1;
      var tnp1;
      var sum;
      var b2n;
      var bm1;
      var lx2;
      var lxp;
      var mbn;
      var lx;
      var t4;
      var h;
      var j;
      var m;
      var n;
      var r;
      var t;
      var u;
      bm1 = b - 1;
      t = a + bm1 / 2;
      if (y < 0.35) {
        lx = log1p(-y);
      } else {
        lx = ln9(x);
      }
      u = -t * lx;
      h = regularizedGammaPrefix(b, u);
      if (h <= MIN_VALUE) {
        return s0;
      }
      if (normalized) {
        prefix = h / gammaDeltaRatio(a, b);
        prefix /= pow(t, b);
      } else {
        prefix = fullIGammaPrefix(b, u) / pow(t, b);
      }
      prefix *= mult;
      p[0] = 1;
      j = gammainc2(u, b, true, true);
      j /= h;
      sum = s0 + prefix * j;
      tnp1 = 1;
      lx2 = lx / 2;
      lx2 *= lx2;
      lxp = 1;
      t4 = 4 * t * t;
      b2n = b;
      for (n = 1; n < p.length; ++n) {
        tnp1 += 2;
        p[n] = 0;
        mbn = b - n;
        tmp1 = 3;
        for (m = 1; m < n; ++m) {
          mbn = m * b - n;
          p[n] += mbn * p[n - m] / factorial(tmp1);
          tmp1 += 2;
        }
        p[n] /= n;
        p[n] += bm1 / factorial(tnp1);
        j = (b2n * (b2n + 1) * j + (u + b2n + 1) * lxp) / t4;
        lxp *= lx2;
        b2n += 2;
        r = prefix * p[n] * j;
        sum += r;
        if (r > 1) {
          if (abs(r) < abs(EPSILON * sum)) {
            break;
          }
        } else if (abs(r / EPSILON) < abs(sum)) {
          break;
        }
      }
      return sum;
    }
    module.exports = betaSmallBLargeASeries;
  }
});

// node_modules/@stdlib/math-base-special-kernel-betainc/lib/rising_factorial_ratio.js
var require_rising_factorial_ratio = __commonJS({
  "node_modules/@stdlib/math-base-special-kernel-betainc/lib/rising_factorial_ratio.js"(exports, module) {
    "use strict";
    function risingFactorialRatio(a, b, k) {
      var result;
      var i;
      if (k === 0) {
        return 1;
      }
      result = 1;
      for (i = 0; i < k; i++) {
        result *= (a + i) / (b + i);
      }
      return result;
    }
    module.exports = risingFactorialRatio;
  }
});

// node_modules/@stdlib/math-base-special-maxabs/lib/main.js
var require_main79 = __commonJS({
  "node_modules/@stdlib/math-base-special-maxabs/lib/main.js"(exports, module) {
    "use strict";
    var abs = require_lib42();
    var max = require_lib72();
    function maxabs(x, y) {
      return max(abs(x), abs(y));
    }
    module.exports = maxabs;
  }
});

// node_modules/@stdlib/math-base-special-maxabs/lib/index.js
var require_lib116 = __commonJS({
  "node_modules/@stdlib/math-base-special-maxabs/lib/index.js"(exports, module) {
    "use strict";
    var maxabs = require_main79();
    module.exports = maxabs;
  }
});

// node_modules/@stdlib/math-base-special-minabs/lib/main.js
var require_main80 = __commonJS({
  "node_modules/@stdlib/math-base-special-minabs/lib/main.js"(exports, module) {
    "use strict";
    var abs = require_lib42();
    var min = require_lib74();
    function minabs(x, y) {
      return min(abs(x), abs(y));
    }
    module.exports = minabs;
  }
});

// node_modules/@stdlib/math-base-special-minabs/lib/index.js
var require_lib117 = __commonJS({
  "node_modules/@stdlib/math-base-special-minabs/lib/index.js"(exports, module) {
    "use strict";
    var minabs = require_main80();
    module.exports = minabs;
  }
});

// node_modules/@stdlib/math-base-special-kernel-betainc/lib/ibeta_power_terms.js
var require_ibeta_power_terms = __commonJS({
  "node_modules/@stdlib/math-base-special-kernel-betainc/lib/ibeta_power_terms.js"(exports, module) {
    "use strict";
    var lanczosSumExpGScaled = require_lib110();
    var maxabs = require_lib116();
    var minabs = require_lib117();
    var expm1 = require_lib36();
    var log1p = require_lib38();
    var sqrt = require_lib39();
    var abs = require_lib42();
    var exp9 = require_lib58();
    var pow = require_lib67();
    var min = require_lib74();
    var ln9 = require_lib95();
    var MAX_LN = require_lib99();
    var MIN_LN = require_lib105();
    var G = require_lib93();
    var E = require_lib68();
    function ibetaPowerTerms(a, b, x, y, normalized) {
      var result;
      var smallA;
      var ratio;
      var agh;
      var bgh;
      var cgh;
      var l1;
      var l2;
      var l3;
      var p1;
      var b1;
      var b2;
      var c;
      var l;
      if (!normalized) {
        return pow(x, a) * pow(y, b);
      }
      c = a + b;
      agh = a + G - 0.5;
      bgh = b + G - 0.5;
      cgh = c + G - 0.5;
      result = lanczosSumExpGScaled(c);
      result /= lanczosSumExpGScaled(a) * lanczosSumExpGScaled(b);
      result *= sqrt(bgh / E);
      result *= sqrt(agh / cgh);
      l1 = (x * b - y * agh) / agh;
      l2 = (y * a - x * bgh) / bgh;
      if (minabs(l1, l2) < 0.2) {
        if (l1 * l2 > 0 || min(a, b) < 1) {
          if (abs(l1) < 0.1) {
            result *= exp9(a * log1p(l1));
          } else {
            result *= pow(x * cgh / agh, a);
          }
          if (abs(l2) < 0.1) {
            result *= exp9(b * log1p(l2));
          } else {
            result *= pow(y * cgh / bgh, b);
          }
        } else if (maxabs(l1, l2) < 0.5) {
          smallA = a < b;
          ratio = b / a;
          if (smallA && ratio * l2 < 0.1 || !smallA && l1 / ratio > 0.1) {
            l3 = expm1(ratio * log1p(l2));
            l3 = l1 + l3 + l3 * l1;
            l3 = a * log1p(l3);
            result *= exp9(l3);
          } else {
            l3 = expm1(log1p(l1) / ratio);
            l3 = l2 + l3 + l3 * l2;
            l3 = b * log1p(l3);
            result *= exp9(l3);
          }
        } else if (abs(l1) < abs(l2)) {
          l = a * log1p(l1) + b * ln9(y * cgh / bgh);
          if (l <= MIN_LN || l >= MAX_LN) {
            l += ln9(result);
            if (l >= MAX_LN) {
              return NaN;
            }
            result = exp9(l);
          } else {
            result *= exp9(l);
          }
        } else {
          l = b * log1p(l2) + a * ln9(x * cgh / agh);
          if (l <= MIN_LN || l >= MAX_LN) {
            l += ln9(result);
            if (l >= MAX_LN) {
              return NaN;
            }
            result = exp9(l);
          } else {
            result *= exp9(l);
          }
        }
      } else {
        b1 = x * cgh / agh;
        b2 = y * cgh / bgh;
        l1 = a * ln9(b1);
        l2 = b * ln9(b2);
        if (l1 >= MAX_LN || l1 <= MIN_LN || l2 >= MAX_LN || l2 <= MIN_LN) {
          if (a < b) {
            p1 = pow(b2, b / a);
            l3 = a * (ln9(b1) + ln9(p1));
            if (l3 < MAX_LN && l3 > MIN_LN) {
              result *= pow(p1 * b1, a);
            } else {
              l2 += l1 + ln9(result);
              if (l2 >= MAX_LN) {
                return NaN;
              }
              result = exp9(l2);
            }
          } else {
            p1 = pow(b1, a / b);
            l3 = (ln9(p1) + ln9(b2)) * b;
            if (l3 < MAX_LN && l3 > MIN_LN) {
              result *= pow(p1 * b2, b);
            } else {
              l2 += l1 + ln9(result);
              if (l2 >= MAX_LN) {
                return NaN;
              }
              result = exp9(l2);
            }
          }
        } else {
          result *= pow(b1, a) * pow(b2, b);
        }
      }
      return result;
    }
    module.exports = ibetaPowerTerms;
  }
});

// node_modules/@stdlib/math-base-special-kernel-betainc/lib/ibeta_fraction2.js
var require_ibeta_fraction2 = __commonJS({
  "node_modules/@stdlib/math-base-special-kernel-betainc/lib/ibeta_fraction2.js"(exports, module) {
    "use strict";
    var continuedFraction = require_lib114();
    var ibetaPowerTerms = require_ibeta_power_terms();
    var OPTS = {
      "keep": true,
      "maxIter": 1e3
    };
    function ibetaFraction2t(a, b, x, y) {
      var m = 0;
      return next;
      function next() {
        var denom;
        var aN;
        var bN;
        aN = (a + m - 1) * (a + b + m - 1) * m * (b - m) * x * x;
        denom = a + 2 * m - 1;
        aN /= denom * denom;
        bN = m;
        bN += m * (b - m) * x / (a + 2 * m - 1);
        bN += (a + m) * (a * y - b * x + 1 + m * (2 - x)) / (a + 2 * m + 1);
        m += 1;
        return [aN, bN];
      }
    }
    function ibetaFraction2(a, b, x, y, normalized, out) {
      var result;
      var fract;
      var f;
      result = ibetaPowerTerms(a, b, x, y, normalized);
      if (out) {
        out[1] = result;
      }
      if (result === 0) {
        return result;
      }
      f = ibetaFraction2t(a, b, x, y);
      fract = continuedFraction(f, OPTS);
      return result / fract;
    }
    module.exports = ibetaFraction2;
  }
});

// node_modules/@stdlib/constants-float64-max-safe-integer/lib/index.js
var require_lib118 = __commonJS({
  "node_modules/@stdlib/constants-float64-max-safe-integer/lib/index.js"(exports, module) {
    "use strict";
    var FLOAT64_MAX_SAFE_INTEGER = 9007199254740991;
    module.exports = FLOAT64_MAX_SAFE_INTEGER;
  }
});

// node_modules/@stdlib/math-base-special-gcd/lib/bitwise_binary_gcd.js
var require_bitwise_binary_gcd = __commonJS({
  "node_modules/@stdlib/math-base-special-gcd/lib/bitwise_binary_gcd.js"(exports, module) {
    "use strict";
    function gcd(a, b) {
      var k = 0;
      var t;
      if (a === 0) {
        return b;
      }
      if (b === 0) {
        return a;
      }
      while ((a & 1) === 0 && (b & 1) === 0) {
        a >>>= 1;
        b >>>= 1;
        k += 1;
      }
      while ((a & 1) === 0) {
        a >>>= 1;
      }
      while (b) {
        while ((b & 1) === 0) {
          b >>>= 1;
        }
        if (a > b) {
          t = b;
          b = a;
          a = t;
        }
        b -= a;
      }
      return a << k;
    }
    module.exports = gcd;
  }
});

// node_modules/@stdlib/math-base-special-gcd/lib/binary_gcd.js
var require_binary_gcd = __commonJS({
  "node_modules/@stdlib/math-base-special-gcd/lib/binary_gcd.js"(exports, module) {
    "use strict";
    function gcd(a, b) {
      var k = 1;
      var t;
      if (a === 0) {
        return b;
      }
      if (b === 0) {
        return a;
      }
      while (a % 2 === 0 && b % 2 === 0) {
        a /= 2;
        b /= 2;
        k *= 2;
      }
      while (a % 2 === 0) {
        a /= 2;
      }
      while (b) {
        while (b % 2 === 0) {
          b /= 2;
        }
        if (a > b) {
          t = b;
          b = a;
          a = t;
        }
        b -= a;
      }
      return k * a;
    }
    module.exports = gcd;
  }
});

// node_modules/@stdlib/math-base-special-gcd/lib/main.js
var require_main81 = __commonJS({
  "node_modules/@stdlib/math-base-special-gcd/lib/main.js"(exports, module) {
    "use strict";
    var isnan = require_lib6();
    var isInteger = require_lib59();
    var PINF = require_lib31();
    var NINF = require_lib33();
    var INT32_MAX = require_lib76();
    var bitwise = require_bitwise_binary_gcd();
    var largeIntegers = require_binary_gcd();
    function gcd(a, b) {
      if (isnan(a) || isnan(b)) {
        return NaN;
      }
      if (a === PINF || b === PINF || a === NINF || b === NINF) {
        return NaN;
      }
      if (!(isInteger(a) && isInteger(b))) {
        return NaN;
      }
      if (a < 0) {
        a = -a;
      }
      if (b < 0) {
        b = -b;
      }
      if (a <= INT32_MAX && b <= INT32_MAX) {
        return bitwise(a, b);
      }
      return largeIntegers(a, b);
    }
    module.exports = gcd;
  }
});

// node_modules/@stdlib/math-base-special-gcd/lib/index.js
var require_lib119 = __commonJS({
  "node_modules/@stdlib/math-base-special-gcd/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main81();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-special-binomcoef/lib/main.js
var require_main82 = __commonJS({
  "node_modules/@stdlib/math-base-special-binomcoef/lib/main.js"(exports, module) {
    "use strict";
    var MAX_SAFE_INTEGER = require_lib118();
    var PINF = require_lib31();
    var isInteger = require_lib59();
    var isnan = require_lib6();
    var isOdd = require_lib61();
    var floor = require_lib37();
    var gcd = require_lib119();
    function binomcoef(n, k) {
      var res;
      var sgn;
      var b;
      var c;
      var d;
      var g;
      var s;
      if (isnan(n) || isnan(k)) {
        return NaN;
      }
      if (!isInteger(n) || !isInteger(k)) {
        return NaN;
      }
      if (k < 0) {
        return 0;
      }
      sgn = 1;
      if (n < 0) {
        n = -n + k - 1;
        if (isOdd(k)) {
          sgn *= -1;
        }
      }
      if (k > n) {
        return 0;
      }
      if (k === 0 || k === n) {
        return sgn;
      }
      if (k === 1 || k === n - 1) {
        return sgn * n;
      }
      if (n - k < k) {
        k = n - k;
      }
      s = floor(MAX_SAFE_INTEGER / n);
      res = 1;
      for (d = 1; d <= k; d++) {
        if (res > s) {
          break;
        }
        res *= n;
        res /= d;
        n -= 1;
      }
      if (d > k) {
        return sgn * res;
      }
      b = binomcoef(n, k - d + 1);
      if (b === PINF) {
        return sgn * b;
      }
      c = binomcoef(k, k - d + 1);
      g = gcd(b, c);
      b /= g;
      c /= g;
      res /= c;
      return sgn * res * b;
    }
    module.exports = binomcoef;
  }
});

// node_modules/@stdlib/math-base-special-binomcoef/lib/index.js
var require_lib120 = __commonJS({
  "node_modules/@stdlib/math-base-special-binomcoef/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main82();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-special-kernel-betainc/lib/binomial_ccdf.js
var require_binomial_ccdf = __commonJS({
  "node_modules/@stdlib/math-base-special-kernel-betainc/lib/binomial_ccdf.js"(exports, module) {
    "use strict";
    var binomcoef = require_lib120();
    var floor = require_lib37();
    var pow = require_lib67();
    var MIN_VALUE = require_lib53();
    function binomialCCDF(n, k, x, y) {
      var startTerm;
      var result;
      var start;
      var term;
      var i;
      result = pow(x, n);
      if (result > MIN_VALUE) {
        term = result;
        for (i = floor(n - 1); i > k; i--) {
          term *= (i + 1) * y / ((n - i) * x);
          result += term;
        }
      } else {
        start = floor(n * x);
        if (start <= k + 1) {
          start = floor(k + 2);
        }
        result = pow(x, start) * pow(y, n - start);
        result *= binomcoef(floor(n), floor(start));
        if (result === 0) {
          for (i = start - 1; i > k; i--) {
            result += pow(x, i) * pow(y, n - i);
            result *= binomcoef(floor(n), floor(i));
          }
        } else {
          term = result;
          startTerm = result;
          for (i = start - 1; i > k; i--) {
            term *= (i + 1) * y / ((n - i) * x);
            result += term;
          }
          term = startTerm;
          for (i = start + 1; i <= n; i++) {
            term *= (n - i + 1) * x / (i * y);
            result += term;
          }
        }
      }
      return result;
    }
    module.exports = binomialCCDF;
  }
});

// node_modules/@stdlib/math-base-special-kernel-betainc/lib/ibeta_a_step.js
var require_ibeta_a_step = __commonJS({
  "node_modules/@stdlib/math-base-special-kernel-betainc/lib/ibeta_a_step.js"(exports, module) {
    "use strict";
    var ibetaPowerTerms = require_ibeta_power_terms();
    function ibetaAStep(a, b, x, y, k, normalized, out) {
      var prefix;
      var term;
      var sum;
      var i;
      prefix = ibetaPowerTerms(a, b, x, y, normalized);
      if (out) {
        out[1] = prefix;
      }
      prefix /= a;
      if (prefix === 0) {
        return prefix;
      }
      sum = 1;
      term = 1;
      for (i = 0; i < k - 1; ++i) {
        term *= (a + b + i) * x / (a + i + 1);
        sum += term;
      }
      prefix *= sum;
      return prefix;
    }
    module.exports = ibetaAStep;
  }
});

// node_modules/@stdlib/math-base-special-kernel-betainc/lib/ibeta_series.js
var require_ibeta_series = __commonJS({
  "node_modules/@stdlib/math-base-special-kernel-betainc/lib/ibeta_series.js"(exports, module) {
    "use strict";
    var lanczosSumExpGScaled = require_lib110();
    var sumSeries = require_lib103();
    var log1p = require_lib38();
    var sqrt = require_lib39();
    var exp9 = require_lib58();
    var pow = require_lib67();
    var ln9 = require_lib95();
    var MIN_VALUE = require_lib53();
    var MAX_LN = require_lib99();
    var MIN_LN = require_lib105();
    var G = require_lib93();
    var E = require_lib68();
    var opts = {
      "maxTerms": 100
    };
    function ibetaSeriesT(a, b, x, result) {
      var poch = 1 - b;
      var n = 1;
      return next;
      function next() {
        var r = result / a;
        a += 1;
        result *= poch * x / n;
        n += 1;
        poch += 1;
        return r;
      }
    }
    function ibetaSeries(a, b, x, s0, normalized, out, y) {
      var result;
      var agh;
      var bgh;
      var cgh;
      var l1;
      var l2;
      var c;
      var s;
      if (normalized) {
        c = a + b;
        agh = a + G - 0.5;
        bgh = b + G - 0.5;
        cgh = c + G - 0.5;
        result = lanczosSumExpGScaled(c) / (lanczosSumExpGScaled(a) * lanczosSumExpGScaled(b));
        l1 = ln9(cgh / bgh) * (b - 0.5);
        l2 = ln9(x * cgh / agh) * a;
        if (l1 > MIN_LN && l1 < MAX_LN && l2 > MIN_LN && l2 < MAX_LN) {
          if (a * b < bgh * 10) {
            result *= exp9((b - 0.5) * log1p(a / bgh));
          } else {
            result *= pow(cgh / bgh, b - 0.5);
          }
          result *= pow(x * cgh / agh, a);
          result *= sqrt(agh / E);
          if (out) {
            out[1] = result * pow(y, b);
          }
        } else {
          result = ln9(result) + l1 + l2 + (ln9(agh) - 1) / 2;
          if (out) {
            out[1] = exp9(result + b * ln9(y));
          }
          result = exp9(result);
        }
      } else {
        result = pow(x, a);
      }
      if (result < MIN_VALUE) {
        return s0;
      }
      s = ibetaSeriesT(a, b, x, result);
      opts.initialValue = s0;
      return sumSeries(s, opts);
    }
    module.exports = ibetaSeries;
  }
});

// node_modules/@stdlib/math-base-special-kernel-betainc/lib/assign.js
var require_assign3 = __commonJS({
  "node_modules/@stdlib/math-base-special-kernel-betainc/lib/assign.js"(exports, module) {
    "use strict";
    var isnan = require_lib6();
    var expm1 = require_lib36();
    var floor = require_lib37();
    var log1p = require_lib38();
    var asin = require_lib41();
    var beta = require_lib70();
    var sqrt = require_lib39();
    var exp9 = require_lib58();
    var pow = require_lib67();
    var max = require_lib72();
    var min = require_lib74();
    var MAX_FLOAT64 = require_lib75();
    var MIN_FLOAT64 = require_lib53();
    var MAX_INT32 = require_lib76();
    var HALF_PI = require_lib77();
    var PI = require_lib78();
    var betaSmallBLargeASeries = require_beta_small_b_large_a_series();
    var risingFactorialRatio = require_rising_factorial_ratio();
    var ibetaPowerTerms = require_ibeta_power_terms();
    var ibetaFraction2 = require_ibeta_fraction2();
    var binomialCCDF = require_binomial_ccdf();
    var ibetaAStep = require_ibeta_a_step();
    var ibetaSeries = require_ibeta_series();
    var ONE_OVER_PI = 1 / PI;
    function ibetaImp(x, a, b, regularized, upper, out, stride, offset) {
      var lambda;
      var prefix;
      var fract;
      var bbar;
      var div;
      var tmp;
      var i0;
      var i1;
      var k;
      var n;
      var p;
      var y;
      y = 1 - x;
      i0 = offset;
      i1 = offset + stride;
      out[i1] = -1;
      if (isnan(x) || x < 0 || x > 1) {
        out[i0] = NaN;
        out[i1] = NaN;
        return out;
      }
      if (regularized) {
        if (a < 0 || b < 0) {
          out[i0] = NaN;
          out[i1] = NaN;
          return out;
        }
        if (a === 0) {
          if (b === 0) {
            out[i0] = NaN;
            out[i1] = NaN;
            return out;
          }
          if (b > 0) {
            out[i0] = upper ? 0 : 1;
            return out;
          }
        } else if (b === 0) {
          if (a > 0) {
            out[i0] = upper ? 1 : 0;
            return out;
          }
        }
      } else if (a <= 0 || b <= 0) {
        out[i0] = NaN;
        out[i1] = NaN;
        return out;
      }
      if (x === 0) {
        if (a === 1) {
          out[i1] = 1;
        } else {
          out[i1] = a < 1 ? MAX_FLOAT64 / 2 : MIN_FLOAT64 * 2;
        }
        if (upper) {
          out[i0] = regularized ? 1 : beta(a, b);
          return out;
        }
        out[i0] = 0;
        return out;
      }
      if (x === 1) {
        if (b === 1) {
          out[i1] = 1;
        } else {
          out[i1] = b < 1 ? MAX_FLOAT64 / 2 : MIN_FLOAT64 * 2;
        }
        if (upper) {
          out[i0] = 0;
        } else {
          out[i0] = regularized ? 1 : beta(a, b);
        }
        return out;
      }
      if (a === 0.5 && b === 0.5) {
        out[i1] = ONE_OVER_PI * sqrt(y * x);
        p = upper ? asin(sqrt(y)) : asin(sqrt(x));
        p /= HALF_PI;
        if (!regularized) {
          p *= PI;
        }
        out[i0] = p;
        return out;
      }
      if (a === 1) {
        tmp = b;
        b = a;
        a = tmp;
        tmp = y;
        y = x;
        x = tmp;
        upper = !upper;
      }
      if (b === 1) {
        if (a === 1) {
          out[i0] = upper ? y : x;
          out[i1] = 1;
          return out;
        }
        out[i1] = a * pow(x, a - 1);
        if (y < 0.5) {
          p = upper ? -expm1(a * log1p(-y)) : exp9(a * log1p(-y));
        } else {
          p = upper ? -(pow(x, a) - 1) : pow(x, a);
        }
        if (!regularized) {
          p /= a;
        }
        out[i0] = p;
        return out;
      }
      if (min(a, b) <= 1) {
        if (x > 0.5) {
          tmp = b;
          b = a;
          a = tmp;
          tmp = y;
          y = x;
          x = tmp;
          upper = !upper;
        }
        if (max(a, b) <= 1) {
          if (a >= min(0.2, b) || pow(x, a) <= 0.9) {
            if (upper) {
              fract = -(regularized ? 1 : beta(a, b));
              upper = false;
              fract = -ibetaSeries(a, b, x, fract, regularized, out, y);
            } else {
              fract = ibetaSeries(a, b, x, 0, regularized, out, y);
            }
          } else {
            tmp = b;
            b = a;
            a = tmp;
            tmp = y;
            y = x;
            x = tmp;
            upper = !upper;
            if (y >= 0.3) {
              if (upper) {
                fract = -(regularized ? 1 : beta(a, b));
                upper = false;
                fract = -ibetaSeries(a, b, x, fract, regularized, out, y);
              } else {
                fract = ibetaSeries(a, b, x, 0, regularized, out, y);
              }
            } else {
              if (regularized) {
                prefix = 1;
              } else {
                prefix = risingFactorialRatio(a + b, a, 20);
              }
              fract = ibetaAStep(a, b, x, y, 20, regularized, out);
              if (upper) {
                fract -= regularized ? 1 : beta(a, b);
                upper = false;
                fract = -betaSmallBLargeASeries(a + 20, b, x, y, fract, prefix, regularized);
              } else {
                fract = betaSmallBLargeASeries(a + 20, b, x, y, fract, prefix, regularized);
              }
            }
          }
        } else if (b <= 1 || x < 0.1 && pow(b * x, a) <= 0.7) {
          if (upper) {
            fract = -(regularized ? 1 : beta(a, b));
            upper = false;
            fract = -ibetaSeries(a, b, x, fract, regularized, out, y);
          } else {
            fract = ibetaSeries(a, b, x, 0, regularized, out, y);
          }
        } else {
          tmp = b;
          b = a;
          a = tmp;
          tmp = y;
          y = x;
          x = tmp;
          upper = !upper;
          if (y >= 0.3) {
            if (upper) {
              fract = -(regularized ? 1 : beta(a, b));
              upper = false;
              fract = -ibetaSeries(a, b, x, fract, regularized, out, y);
            } else {
              fract = ibetaSeries(a, b, x, 0, regularized, out, y);
            }
          } else if (a >= 15) {
            if (upper) {
              fract = -(regularized ? 1 : beta(a, b));
              upper = false;
              fract = -betaSmallBLargeASeries(a, b, x, y, fract, 1, regularized);
            } else {
              fract = betaSmallBLargeASeries(a, b, x, y, 0, 1, regularized);
            }
          } else {
            if (regularized) {
              prefix = 1;
            } else {
              prefix = risingFactorialRatio(a + b, a, 20);
            }
            fract = ibetaAStep(a, b, x, y, 20, regularized, out);
            if (upper) {
              fract -= regularized ? 1 : beta(a, b);
              upper = false;
              fract = -betaSmallBLargeASeries(a + 20, b, x, y, fract, prefix, regularized);
            } else {
              fract = betaSmallBLargeASeries(a + 20, b, x, y, fract, prefix, regularized);
            }
          }
        }
      } else {
        if (a < b) {
          lambda = a - (a + b) * x;
        } else {
          lambda = (a + b) * y - b;
        }
        if (lambda < 0) {
          tmp = b;
          b = a;
          a = tmp;
          tmp = y;
          y = x;
          x = tmp;
          upper = !upper;
        }
        if (b < 40) {
          if (floor(a) === a && floor(b) === b && a < MAX_INT32 - 100) {
            k = a - 1;
            n = b + k;
            fract = binomialCCDF(n, k, x, y);
            if (!regularized) {
              fract *= beta(a, b);
            }
          } else if (b * x <= 0.7) {
            if (upper) {
              fract = -(regularized ? 1 : beta(a, b));
              upper = false;
              fract = -ibetaSeries(a, b, x, fract, regularized, out, y);
            } else {
              fract = ibetaSeries(a, b, x, 0, regularized, out, y);
            }
          } else if (a > 15) {
            n = floor(b);
            if (n === b) {
              n -= 1;
            }
            bbar = b - n;
            if (regularized) {
              prefix = 1;
            } else {
              prefix = risingFactorialRatio(a + bbar, bbar, n);
            }
            fract = ibetaAStep(bbar, a, y, x, n, regularized);
            fract = betaSmallBLargeASeries(a, bbar, x, y, fract, 1, regularized);
            fract /= prefix;
          } else if (regularized) {
            n = floor(b);
            bbar = b - n;
            if (bbar <= 0) {
              n -= 1;
              bbar += 1;
            }
            fract = ibetaAStep(bbar, a, y, x, n, regularized);
            fract += ibetaAStep(a, bbar, x, y, 20, regularized);
            if (upper) {
              fract -= 1;
            }
            fract = betaSmallBLargeASeries(a + 20, bbar, x, y, fract, 1, regularized);
            if (upper) {
              fract = -fract;
              upper = false;
            }
          } else {
            fract = ibetaFraction2(a, b, x, y, regularized, out);
          }
        } else {
          fract = ibetaFraction2(a, b, x, y, regularized, out);
        }
      }
      if (out[i1] < 0) {
        out[i1] = ibetaPowerTerms(a, b, x, y, true);
      }
      div = y * x;
      if (out[i1] !== 0) {
        if (MAX_FLOAT64 * div < out[i1]) {
          out[i1] = MAX_FLOAT64 / 2;
        } else {
          out[i1] /= div;
        }
      }
      out[i0] = upper ? (regularized ? 1 : beta(a, b)) - fract : fract;
      return out;
    }
    module.exports = ibetaImp;
  }
});

// node_modules/@stdlib/math-base-special-kernel-betainc/lib/main.js
var require_main83 = __commonJS({
  "node_modules/@stdlib/math-base-special-kernel-betainc/lib/main.js"(exports, module) {
    "use strict";
    var compute2 = require_assign3();
    function kernelBetainc(x, a, b, regularized, upper) {
      return compute2(x, a, b, regularized, upper, [0, 0], 1, 0);
    }
    module.exports = kernelBetainc;
  }
});

// node_modules/@stdlib/math-base-special-kernel-betainc/lib/index.js
var require_lib121 = __commonJS({
  "node_modules/@stdlib/math-base-special-kernel-betainc/lib/index.js"(exports, module) {
    "use strict";
    var setReadOnly = require_lib5();
    var main = require_main83();
    var assign = require_assign3();
    setReadOnly(main, "assign", assign);
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-special-betainc/lib/main.js
var require_main84 = __commonJS({
  "node_modules/@stdlib/math-base-special-betainc/lib/main.js"(exports, module) {
    "use strict";
    var kernelBetainc = require_lib121().assign;
    function betainc2(x, a, b, regularized, upper) {
      var out = [0, 0];
      regularized = regularized === false ? false : true;
      upper = upper === true ? true : false;
      kernelBetainc(x, a, b, regularized, upper, out, 1, 0);
      return out[0];
    }
    module.exports = betainc2;
  }
});

// node_modules/@stdlib/math-base-special-betainc/lib/index.js
var require_lib122 = __commonJS({
  "node_modules/@stdlib/math-base-special-betainc/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main84();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-special-erfcinv/lib/rational_p1q1.js
var require_rational_p1q12 = __commonJS({
  "node_modules/@stdlib/math-base-special-erfcinv/lib/rational_p1q1.js"(exports, module) {
    "use strict";
    function evalrational(x) {
      var ax;
      var s1;
      var s2;
      if (x === 0) {
        return -5087819496582806e-19;
      }
      if (x < 0) {
        ax = -x;
      } else {
        ax = x;
      }
      if (ax <= 1) {
        s1 = -5087819496582806e-19 + x * (-0.008368748197417368 + x * (0.03348066254097446 + x * (-0.012692614766297404 + x * (-0.03656379714117627 + x * (0.02198786811111689 + x * (0.008226878746769157 + x * (-0.005387729650712429 + x * (0 + x * 0))))))));
        s2 = 1 + x * (-0.9700050433032906 + x * (-1.5657455823417585 + x * (1.5622155839842302 + x * (0.662328840472003 + x * (-0.7122890234154284 + x * (-0.05273963823400997 + x * (0.07952836873415717 + x * (-0.0023339375937419 + x * 8862163904564247e-19))))))));
      } else {
        x = 1 / x;
        s1 = 0 + x * (0 + x * (-0.005387729650712429 + x * (0.008226878746769157 + x * (0.02198786811111689 + x * (-0.03656379714117627 + x * (-0.012692614766297404 + x * (0.03348066254097446 + x * (-0.008368748197417368 + x * -5087819496582806e-19))))))));
        s2 = 8862163904564247e-19 + x * (-0.0023339375937419 + x * (0.07952836873415717 + x * (-0.05273963823400997 + x * (-0.7122890234154284 + x * (0.662328840472003 + x * (1.5622155839842302 + x * (-1.5657455823417585 + x * (-0.9700050433032906 + x * 1))))))));
      }
      return s1 / s2;
    }
    module.exports = evalrational;
  }
});

// node_modules/@stdlib/math-base-special-erfcinv/lib/rational_p2q2.js
var require_rational_p2q22 = __commonJS({
  "node_modules/@stdlib/math-base-special-erfcinv/lib/rational_p2q2.js"(exports, module) {
    "use strict";
    function evalrational(x) {
      var ax;
      var s1;
      var s2;
      if (x === 0) {
        return -0.20243350835593876;
      }
      if (x < 0) {
        ax = -x;
      } else {
        ax = x;
      }
      if (ax <= 1) {
        s1 = -0.20243350835593876 + x * (0.10526468069939171 + x * (8.3705032834312 + x * (17.644729840837403 + x * (-18.851064805871424 + x * (-44.6382324441787 + x * (17.445385985570866 + x * (21.12946554483405 + x * -3.6719225470772936)))))));
        s2 = 1 + x * (6.242641248542475 + x * (3.971343795334387 + x * (-28.66081804998 + x * (-20.14326346804852 + x * (48.560921310873994 + x * (10.826866735546016 + x * (-22.643693341313973 + x * 1.7211476576120028)))))));
      } else {
        x = 1 / x;
        s1 = -3.6719225470772936 + x * (21.12946554483405 + x * (17.445385985570866 + x * (-44.6382324441787 + x * (-18.851064805871424 + x * (17.644729840837403 + x * (8.3705032834312 + x * (0.10526468069939171 + x * -0.20243350835593876)))))));
        s2 = 1.7211476576120028 + x * (-22.643693341313973 + x * (10.826866735546016 + x * (48.560921310873994 + x * (-20.14326346804852 + x * (-28.66081804998 + x * (3.971343795334387 + x * (6.242641248542475 + x * 1)))))));
      }
      return s1 / s2;
    }
    module.exports = evalrational;
  }
});

// node_modules/@stdlib/math-base-special-erfcinv/lib/rational_p3q3.js
var require_rational_p3q32 = __commonJS({
  "node_modules/@stdlib/math-base-special-erfcinv/lib/rational_p3q3.js"(exports, module) {
    "use strict";
    function evalrational(x) {
      var ax;
      var s1;
      var s2;
      if (x === 0) {
        return -0.1311027816799519;
      }
      if (x < 0) {
        ax = -x;
      } else {
        ax = x;
      }
      if (ax <= 1) {
        s1 = -0.1311027816799519 + x * (-0.16379404719331705 + x * (0.11703015634199525 + x * (0.38707973897260434 + x * (0.3377855389120359 + x * (0.14286953440815717 + x * (0.029015791000532906 + x * (0.0021455899538880526 + x * (-6794655751811263e-22 + x * (28522533178221704e-24 + x * -681149956853777e-24)))))))));
        s2 = 1 + x * (3.4662540724256723 + x * (5.381683457070069 + x * (4.778465929458438 + x * (2.5930192162362027 + x * (0.848854343457902 + x * (0.15226433829533179 + x * (0.011059242293464892 + x * (0 + x * (0 + x * 0)))))))));
      } else {
        x = 1 / x;
        s1 = -681149956853777e-24 + x * (28522533178221704e-24 + x * (-6794655751811263e-22 + x * (0.0021455899538880526 + x * (0.029015791000532906 + x * (0.14286953440815717 + x * (0.3377855389120359 + x * (0.38707973897260434 + x * (0.11703015634199525 + x * (-0.16379404719331705 + x * -0.1311027816799519)))))))));
        s2 = 0 + x * (0 + x * (0 + x * (0.011059242293464892 + x * (0.15226433829533179 + x * (0.848854343457902 + x * (2.5930192162362027 + x * (4.778465929458438 + x * (5.381683457070069 + x * (3.4662540724256723 + x * 1)))))))));
      }
      return s1 / s2;
    }
    module.exports = evalrational;
  }
});

// node_modules/@stdlib/math-base-special-erfcinv/lib/rational_p4q4.js
var require_rational_p4q4 = __commonJS({
  "node_modules/@stdlib/math-base-special-erfcinv/lib/rational_p4q4.js"(exports, module) {
    "use strict";
    function evalrational(x) {
      var ax;
      var s1;
      var s2;
      if (x === 0) {
        return -0.0350353787183178;
      }
      if (x < 0) {
        ax = -x;
      } else {
        ax = x;
      }
      if (ax <= 1) {
        s1 = -0.0350353787183178 + x * (-0.0022242652921344794 + x * (0.018557330651423107 + x * (0.009508047013259196 + x * (0.0018712349281955923 + x * (15754461742496055e-20 + x * (460469890584318e-20 + x * (-2304047769118826e-25 + x * 26633922742578204e-28)))))));
        s2 = 1 + x * (1.3653349817554064 + x * (0.7620591645536234 + x * (0.22009110576413124 + x * (0.03415891436709477 + x * (0.00263861676657016 + x * (7646752923027944e-20 + x * (0 + x * 0)))))));
      } else {
        x = 1 / x;
        s1 = 26633922742578204e-28 + x * (-2304047769118826e-25 + x * (460469890584318e-20 + x * (15754461742496055e-20 + x * (0.0018712349281955923 + x * (0.009508047013259196 + x * (0.018557330651423107 + x * (-0.0022242652921344794 + x * -0.0350353787183178)))))));
        s2 = 0 + x * (0 + x * (7646752923027944e-20 + x * (0.00263861676657016 + x * (0.03415891436709477 + x * (0.22009110576413124 + x * (0.7620591645536234 + x * (1.3653349817554064 + x * 1)))))));
      }
      return s1 / s2;
    }
    module.exports = evalrational;
  }
});

// node_modules/@stdlib/math-base-special-erfcinv/lib/rational_p5q5.js
var require_rational_p5q5 = __commonJS({
  "node_modules/@stdlib/math-base-special-erfcinv/lib/rational_p5q5.js"(exports, module) {
    "use strict";
    function evalrational(x) {
      var ax;
      var s1;
      var s2;
      if (x === 0) {
        return -0.016743100507663373;
      }
      if (x < 0) {
        ax = -x;
      } else {
        ax = x;
      }
      if (ax <= 1) {
        s1 = -0.016743100507663373 + x * (-0.0011295143874558028 + x * (0.001056288621524929 + x * (20938631748758808e-20 + x * (14962478375834237e-21 + x * (44969678992770644e-23 + x * (4625961635228786e-24 + x * (-2811287356288318e-29 + x * 9905570997331033e-32)))))));
        s2 = 1 + x * (0.5914293448864175 + x * (0.1381518657490833 + x * (0.016074608709367652 + x * (9640118070051656e-19 + x * (27533547476472603e-21 + x * (282243172016108e-21 + x * (0 + x * 0)))))));
      } else {
        x = 1 / x;
        s1 = 9905570997331033e-32 + x * (-2811287356288318e-29 + x * (4625961635228786e-24 + x * (44969678992770644e-23 + x * (14962478375834237e-21 + x * (20938631748758808e-20 + x * (0.001056288621524929 + x * (-0.0011295143874558028 + x * -0.016743100507663373)))))));
        s2 = 0 + x * (0 + x * (282243172016108e-21 + x * (27533547476472603e-21 + x * (9640118070051656e-19 + x * (0.016074608709367652 + x * (0.1381518657490833 + x * (0.5914293448864175 + x * 1)))))));
      }
      return s1 / s2;
    }
    module.exports = evalrational;
  }
});

// node_modules/@stdlib/math-base-special-erfcinv/lib/main.js
var require_main85 = __commonJS({
  "node_modules/@stdlib/math-base-special-erfcinv/lib/main.js"(exports, module) {
    "use strict";
    var isnan = require_lib6();
    var sqrt = require_lib39();
    var ln9 = require_lib95();
    var PINF = require_lib31();
    var NINF = require_lib33();
    var rationalFcnR1 = require_rational_p1q12();
    var rationalFcnR2 = require_rational_p2q22();
    var rationalFcnR3 = require_rational_p3q32();
    var rationalFcnR4 = require_rational_p4q4();
    var rationalFcnR5 = require_rational_p5q5();
    var Y1 = 0.08913147449493408;
    var Y2 = 2.249481201171875;
    var Y3 = 0.807220458984375;
    var Y4 = 0.9399557113647461;
    var Y5 = 0.9836282730102539;
    function erfcinv2(x) {
      var sign;
      var qs;
      var q;
      var g;
      var r;
      if (isnan(x)) {
        return NaN;
      }
      if (x === 0) {
        return PINF;
      }
      if (x === 2) {
        return NINF;
      }
      if (x === 1) {
        return 0;
      }
      if (x > 2 || x < 0) {
        return NaN;
      }
      if (x > 1) {
        sign = -1;
        q = 2 - x;
      } else {
        sign = 1;
        q = x;
      }
      x = 1 - q;
      if (x <= 0.5) {
        g = x * (x + 10);
        r = rationalFcnR1(x);
        return sign * (g * Y1 + g * r);
      }
      if (q >= 0.25) {
        g = sqrt(-2 * ln9(q));
        q -= 0.25;
        r = rationalFcnR2(q);
        return sign * (g / (Y2 + r));
      }
      q = sqrt(-ln9(q));
      if (q < 3) {
        qs = q - 1.125;
        r = rationalFcnR3(qs);
        return sign * (Y3 * q + r * q);
      }
      if (q < 6) {
        qs = q - 3;
        r = rationalFcnR4(qs);
        return sign * (Y4 * q + r * q);
      }
      qs = q - 6;
      r = rationalFcnR5(qs);
      return sign * (Y5 * q + r * q);
    }
    module.exports = erfcinv2;
  }
});

// node_modules/@stdlib/math-base-special-erfcinv/lib/index.js
var require_lib123 = __commonJS({
  "node_modules/@stdlib/math-base-special-erfcinv/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main85();
    module.exports = main;
  }
});

// node_modules/@stdlib/math-base-special-erfcx/lib/erfcx_y100.js
var require_erfcx_y100 = __commonJS({
  "node_modules/@stdlib/math-base-special-erfcx/lib/erfcx_y100.js"(exports, module) {
    "use strict";
    var floor = require_lib37();
    var table = [p0, p1, p2, p3, p4, p5, p6, p7, p8, p9, p10, p11, p12, p13, p14, p15, p16, p17, p18, p19, p20, p21, p22, p23, p24, p25, p26, p27, p28, p29, p30, p31, p32, p33, p34, p35, p36, p37, p38, p39, p40, p41, p42, p43, p44, p45, p46, p47, p48, p49, p50, p51, p52, p53, p54, p55, p56, p57, p58, p59, p60, p61, p62, p63, p64, p65, p66, p67, p68, p69, p70, p71, p72, p73, p74, p75, p76, p77, p78, p79, p80, p81, p82, p83, p84, p85, p86, p87, p88, p89, p90, p91, p92, p93, p94, p95, p96, p97, p98, p99, p100];
    function p0(t) {
      return 7087803245410644e-19 + (712340910470263e-18 + (35779077297597742e-22 + (17403143962587938e-24 + (8171066004730779e-26 + (3688502236043496e-28 + 15917038551111112e-31 * t) * t) * t) * t) * t) * t;
    }
    function p1(t) {
      return 0.0021479143208285143 + (7268640236737999e-19 + (36843175430938994e-22 + (180718412721492e-22 + (8549644929604033e-26 + (3885203751853429e-28 + 16868473576888889e-31 * t) * t) * t) * t) * t) * t;
    }
    function p2(t) {
      return 0.0036165255935630175 + (7418209232355551e-19 + (3794831995752824e-21 + (18771627021793087e-24 + (8948471512241509e-26 + (4093585851777244e-28 + 1787206146488889e-30 * t) * t) * t) * t) * t) * t;
    }
    function p3(t) {
      return 0.005115498386003198 + (7572284073479166e-19 + (390964257267357e-20 + (1950416870430047e-23 + (93687503063179e-24 + (43143925959079665e-29 + 18939926435555556e-31 * t) * t) * t) * t) * t) * t;
    }
    function p4(t) {
      return 0.006645751317267305 + (7731040605444745e-19 + (4028951058939944e-21 + (20271233238288382e-24 + (981176313217091e-25 + (4548420740601775e-28 + 2007635221333333e-30 * t) * t) * t) * t) * t) * t;
    }
    function p5(t) {
      return 0.008208238997024121 + (7894662961188171e-19 + (4152970155262265e-21 + (21074693344544657e-24 + (10278874108587318e-26 + (4796520139061334e-28 + 21285907413333335e-31 * t) * t) * t) * t) * t) * t;
    }
    function p6(t) {
      return 0.009803953727535219 + (8063344010834284e-19 + (4281924132973699e-21 + (21916534346907168e-24 + (10771535136565471e-26 + (5059597262369282e-28 + 22573462684444446e-31 * t) * t) * t) * t) * t) * t;
    }
    function p7(t) {
      return 0.011433927298290302 + (8237285838319657e-19 + (4416049531176544e-21 + (22798861426211987e-24 + (1129129174587924e-25 + (5338618936581688e-28 + 23944209546666666e-31 * t) * t) * t) * t) * t) * t;
    }
    function p8(t) {
      return 0.013099232878814654 + (8416700246790696e-19 + (4555595898845751e-21 + (23723907357214174e-24 + (11839789326602696e-26 + (5634616306755024e-28 + 25403679644444446e-31 * t) * t) * t) * t) * t) * t;
    }
    function p9(t) {
      return 0.014800987015587536 + (8601809294634594e-19 + (4700826584881687e-21 + (24694040760197315e-24 + (12418779768752298e-26 + (5948689037032026e-28 + 2695776456888889e-30 * t) * t) * t) * t) * t) * t;
    }
    function p10(t) {
      return 0.01654035173939407 + (8792845864124146e-19 + (4852019579300175e-21 + (2571177490088171e-23 + (13030128534230821e-26 + (6282009758687478e-28 + 28612737351111112e-31 * t) * t) * t) * t) * t) * t;
    }
    function p11(t) {
      return 0.018318536789842393 + (8990054264789172e-19 + (5009468408955337e-21 + (2677977707421807e-23 + (13675822186304616e-26 + (6635828774535271e-28 + 30375273884444443e-31 * t) * t) * t) * t) * t) * t;
    }
    function p12(t) {
      return 0.020136801964214277 + (9193690873767368e-19 + (51734830914104276e-22 + (27900878609710433e-24 + (1435797640280904e-25 + (7011479031104373e-28 + 32252476e-22 * t) * t) * t) * t) * t) * t;
    }
    function p13(t) {
      return 0.021996459598282742 + (9404024815536678e-19 + (5344391150804117e-21 + (29078085538049375e-24 + (1507884450032973e-25 + (741038136474992e-27 + 3425189232e-24 * t) * t) * t) * t) * t) * t;
    }
    function p14(t) {
      return 0.02389887718722632 + (9621338683590018e-19 + (55225386998049015e-22 + (30314589961047687e-24 + (15840826497296334e-26 + (7834050047241445e-28 + 36381553564444445e-31 * t) * t) * t) * t) * t) * t;
    }
    function p15(t) {
      return 0.025845480155298518 + (9845929306782012e-19 + (5708291592005185e-21 + (3161378216916483e-23 + (1664647874552963e-25 + (828409859287854e-27 + 3864997576888889e-30 * t) * t) * t) * t) * t) * t;
    }
    function p16(t) {
      return 0.027837754783474698 + (0.0010078108563256892 + (59020366493792216e-22 + (3297926355324652e-23 + (17498524159268457e-26 + (8762245912484253e-28 + 4106620648888889e-30 * t) * t) * t) * t) * t) * t;
    }
    function p17(t) {
      return 0.029877251304899308 + (0.001031820424505735 + (6104182969716206e-21 + (3441486035954272e-23 + (1839986307293409e-25 + (9270322736636504e-28 + 43639844053333335e-31 * t) * t) * t) * t) * t) * t;
    }
    function p18(t) {
      return 0.03196558717859645 + (0.0010566560976716574 + (6315163319241458e-21 + (3592463833952192e-23 + (19353584758781173e-26 + (9810278385988926e-28 + 46381060817777776e-31 * t) * t) * t) * t) * t) * t;
    }
    function p19(t) {
      return 0.03410445055258834 + (0.0010823541191350532 + (6535435615955393e-21 + (37512918348533524e-24 + (20362979635817883e-26 + (10384187833037281e-28 + 4930062526222222e-30 * t) * t) * t) * t) * t) * t;
    }
    function p20(t) {
      return 0.036295603928292425 + (0.0011089526167995269 + (6765484509551836e-21 + (3918429294991359e-23 + (21431552202133775e-26 + (10994259106646732e-28 + 5240994910222222e-30 * t) * t) * t) * t) * t) * t;
    }
    function p21(t) {
      return 0.03854088803884051 + (0.001136491713417542 + (7005823064124631e-21 + (40943644083718584e-24 + (22563034723692883e-26 + (11642841011361993e-28 + 5572109287111111e-30 * t) * t) * t) * t) * t) * t;
    }
    function p22(t) {
      return 0.04084222595478596 + (0.0011650136437945675 + (72569945502343e-19 + (4279616186185504e-23 + (23761401711005023e-26 + (12332431172381557e-28 + 5924680236444444e-30 * t) * t) * t) * t) * t) * t;
    }
    function p23(t) {
      return 0.04320162743154022 + (0.0011945628793917271 + (751957435328492e-20 + (4474736455396099e-23 + (2503088521647295e-25 + (13065684400300477e-28 + 6300053285333334e-30 * t) * t) * t) * t) * t) * t;
    }
    function p24(t) {
      return 0.04562119351381047 + (0.001225186260806753 + (7794172005555192e-21 + (4680311983095446e-23 + (26375990983978426e-26 + (1384542137097712e-27 + 66996477404444446e-31 * t) * t) * t) * t) * t) * t;
    }
    function p25(t) {
      return 0.048103121413299865 + (0.0012569331386432195 + (8081433349636768e-21 + (4896966733568202e-23 + (27801515481905746e-26 + (14674637611609885e-28 + 7124958935111111e-30 * t) * t) * t) * t) * t) * t;
    }
    function p26(t) {
      return 0.05064970967698334 + (0.0012898555233099055 + (838204284145688e-20 + (5125364265255184e-23 + (29312563849675507e-26 + (15556512782814827e-28 + 7577560782222223e-30 * t) * t) * t) * t) * t) * t;
    }
    function p27(t) {
      return 0.053263363664388864 + (0.0013240082443256975 + (8696726001500767e-21 + (536621027503968e-22 + (309145687866348e-24 + (16494420240828494e-28 + 8059107964444444e-30 * t) * t) * t) * t) * t) * t;
    }
    function p28(t) {
      return 0.05594660135350001 + (0.001359449119740819 + (9026252023301638e-21 + (56202552975056696e-24 + (3261331041050314e-25 + (17491936862246368e-28 + 8571338168888888e-30 * t) * t) * t) * t) * t) * t;
    }
    function p29(t) {
      return 0.058702059496154084 + (0.0013962391363223647 + (9371436548731279e-21 + (58882975670265285e-24 + (34414937110591756e-26 + (1855285310975186e-27 + 911607367111111e-29 * t) * t) * t) * t) * t) * t;
    }
    function p30(t) {
      return 0.061532500145144775 + (0.0014344426411912014 + (9733144620101681e-21 + (6171186050734718e-23 + (363259874182953e-24 + (19681183310134517e-28 + 969522384e-23 * t) * t) * t) * t) * t) * t;
    }
    function p31(t) {
      return 0.06444081757665329 + (0.0014741275456383132 + (10112293819576438e-21 + (6469823660593325e-23 + (38353412915303665e-26 + (2088117611438512e-27 + 1031078448e-23 * t) * t) * t) * t) * t) * t;
    }
    function p32(t) {
      return 0.06743004563313039 + (0.001515365541891654 + (10509857606888329e-21 + (6785170652936334e-23 + (4050460219481114e-25 + (22157325110542536e-28 + 10964842115555555e-30 * t) * t) * t) * t) * t) * t;
    }
    function p33(t) {
      return 0.07050336551333886 + (0.001558232333649571 + (1092686886686523e-20 + (7118248223961351e-23 + (42787405890153386e-26 + (2351437952227442e-27 + 11659571751111111e-30 * t) * t) * t) * t) * t) * t;
    }
    function p34(t) {
      return 0.0736641140379446 + (0.001602807881243882 + (11364423678778208e-21 + (7470142309742318e-23 + (4521016277747649e-25 + (2495735500408857e-27 + 12397238257777777e-30 * t) * t) * t) * t) * t) * t;
    }
    function p35(t) {
      return 0.07691579242081956 + (0.0016491766623447889 + (11823685320041301e-21 + (7842007599378154e-23 + (4778172695691648e-25 + (26491544403815725e-28 + 13180196462222222e-30 * t) * t) * t) * t) * t) * t;
    }
    function p36(t) {
      return 0.08026207557809462 + (0.0016974279491709504 + (12305888517309891e-21 + (8235071769897904e-23 + (5051149610985711e-25 + (281225284976269e-26 + 14010889635555555e-30 * t) * t) * t) * t) * t) * t;
    }
    function p37(t) {
      return 0.08370682200898036 + (0.0017476561032212657 + (12812343958540764e-21 + (8650639951503644e-23 + (5340944082386946e-25 + (29856186620887555e-28 + 1489185159111111e-29 * t) * t) * t) * t) * t) * t;
    }
    function p38(t) {
      return 0.08725408428446171 + (0.0017999608886001962 + (13344443080089493e-21 + (90900994316429e-21 + (5648613497261646e-25 + (3169870708003396e-27 + 15825697795555556e-30 * t) * t) * t) * t) * t) * t;
    }
    function p39(t) {
      return 0.09090812018217274 + (0.00185444780506577 + (1390366314342612e-20 + (9554924606254991e-23 + (5975278712524205e-25 + (336565973660991e-26 + 16815130613333334e-30 * t) * t) * t) * t) * t) * t;
    }
    function p40(t) {
      return 0.09467340450807549 + (0.0019112284419887304 + (14491572616545005e-21 + (10046682186333614e-23 + (63221272959791e-23 + (3573669397558913e-27 + 1786293159111111e-29 * t) * t) * t) * t) * t) * t;
    }
    function p41(t) {
      return 0.09855464164800445 + (0.0019704208544725622 + (15109836875625445e-21 + (10567036667675984e-23 + (6690416864001935e-25 + (3794617185082434e-27 + 1897195904e-23 * t) * t) * t) * t) * t) * t;
    }
    function p42(t) {
      return 0.1025567788947009 + (0.0020321499629472857 + (1576022424296218e-20 + (11117756071353507e-23 + (7081478511009766e-25 + (4029255327663256e-27 + 20145143075555556e-30 * t) * t) * t) * t) * t) * t;
    }
    function p43(t) {
      return 0.10668502059865094 + (0.002096547977614873 + (16444612377624982e-21 + (11700717962026153e-23 + (7496720325093842e-25 + (42783716186085925e-28 + 2138547936e-23 * t) * t) * t) * t) * t) * t;
    }
    function p44(t) {
      return 0.11094484319386444 + (0.002163754849190817 + (17164995035719656e-21 + (12317915750735938e-23 + (7937630983149963e-25 + (4542790176310636e-27 + 22696025653333333e-30 * t) * t) * t) * t) * t) * t;
    }
    function p45(t) {
      return 0.11534201115268805 + (0.002233918747454642 + (17923489217504226e-21 + (12971465288245997e-23 + (8405783418038907e-25 + (48233721206418025e-28 + 24079890062222222e-30 * t) * t) * t) * t) * t) * t;
    }
    function p46(t) {
      return 0.11988259392684095 + (0.002307196569191869 + (18722342718958937e-21 + (13663611754337958e-23 + (8902838548849328e-25 + (5121016156922585e-27 + 2554022711111111e-29 * t) * t) * t) * t) * t) * t;
    }
    function p47(t) {
      return 0.12457298393509812 + (0.0023837544771809576 + (1956394210571161e-20 + (1439673684773947e-22 + (9430549064645925e-25 + (5436659058313422e-27 + 2708022592e-23 * t) * t) * t) * t) * t) * t;
    }
    function p48(t) {
      return 0.12941991566142438 + (0.002463768471950886 + (2045082112747588e-20 + (15173366280523906e-23 + (9990763250638903e-25 + (5771276031135163e-27 + 28703099555555555e-30 * t) * t) * t) * t) * t) * t;
    }
    function p49(t) {
      return 0.13443048593088697 + (0.0025474249981080823 + (21385669591362916e-21 + (15996177579900442e-23 + (10585428844575133e-25 + (6125880953678788e-27 + 3041208014222222e-29 * t) * t) * t) * t) * t) * t;
    }
    function p50(t) {
      return 0.13961217543434562 + (0.0026349215871051762 + (22371342712572568e-21 + (16868008199296823e-23 + (11216596910444997e-25 + (6501526475309089e-27 + 3221039450666667e-29 * t) * t) * t) * t) * t) * t;
    }
    function p51(t) {
      return 0.144972871576738 + (0.002726467538398244 + (2341087096105095e-20 + (17791863939526378e-23 + (11886425714330958e-25 + (68993039665054284e-28 + 34101266222222225e-30 * t) * t) * t) * t) * t) * t;
    }
    function p52(t) {
      return 0.15052089272774619 + (0.0028222846410136237 + (24507470422713398e-21 + (18770927679626137e-23 + (1259718458758337e-24 + (7320343304922983e-27 + 36087889048888887e-30 * t) * t) * t) * t) * t) * t;
    }
    function p53(t) {
      return 0.1562650139577461 + (0.0029226079376196627 + (2566455369376845e-20 + (19808568415654462e-23 + (13351257759815557e-25 + (7765812489104676e-27 + 3817342003555556e-29 * t) * t) * t) * t) * t) * t;
    }
    function p54(t) {
      return 0.16221449434620738 + (0.0030276865332726477 + (26885741326534563e-21 + (20908350604346383e-23 + (1415114814424073e-24 + (8236917066597432e-27 + 4036095745777778e-29 * t) * t) * t) * t) * t) * t;
    }
    function p55(t) {
      return 0.1683791059541213 + (0.0031377844510793083 + (28174873844911173e-21 + (22074043807045782e-23 + (1499948105599609e-24 + (8734899366193081e-27 + 4265352897777778e-29 * t) * t) * t) * t) * t) * t;
    }
    function p56(t) {
      return 0.1747691645565937 + (0.0032531815370903066 + (29536024347344365e-21 + (23309632627767074e-23 + (15899007843582445e-25 + (9261037523542736e-27 + 45054073102222224e-30 * t) * t) * t) * t) * t) * t;
    }
    function p57(t) {
      return 0.18139556223643702 + (0.0033741744168097 + (309735117147095e-19 + (2461932693759229e-22 + (16852609412267751e-25 + (981664429428549e-26 + 4756541809777778e-29 * t) * t) * t) * t) * t) * t;
    }
    function p58(t) {
      return 0.18826980194443665 + (0.0035010775057740316 + (3249191444001427e-20 + (2600757237588632e-22 + (17863299617388377e-25 + (10403065638343878e-27 + 5019026583111111e-29 * t) * t) * t) * t) * t) * t;
    }
    function p59(t) {
      return 0.19540403413693969 + (0.0036342240767211326 + (34096085096200906e-21 + (27479061117017636e-23 + (18934228504790033e-25 + (11021679075323599e-27 + 5293117173333333e-29 * t) * t) * t) * t) * t) * t;
    }
    function p60(t) {
      return 0.20281109560651886 + (0.00377396738593236 + (3579116545759241e-20 + (29038742889416174e-23 + (20068685374849e-22 + (11673891799578381e-27 + 55790523093333335e-30 * t) * t) * t) * t) * t) * t;
    }
    function p61(t) {
      return 0.21050455062669335 + (0.003920681861392565 + (37582602289680105e-21 + (30691836231886877e-23 + (21270101645763676e-25 + (12361138551062899e-27 + 5877052016e-23 * t) * t) * t) * t) * t) * t;
    }
    function p62(t) {
      return 0.21849873453703333 + (0.004074764355468959 + (3947616382098671e-20 + (3244383997013992e-22 + (2254205349151868e-24 + (13084879235290859e-27 + 6187315326222222e-29 * t) * t) * t) * t) * t) * t;
    }
    function p63(t) {
      return 0.2268087999004323 + (0.004236635464862852 + (41477956909656896e-21 + (3430054489450281e-22 + (23888264229264067e-25 + (13846596292818514e-27 + 6510018375111112e-29 * t) * t) * t) * t) * t) * t;
    }
    function p64(t) {
      return 0.23545076536988704 + (0.004406740920636517 + (435944449162247e-19 + (36268045617760415e-23 + (253126064308532e-23 + (14647791812837902e-27 + 6845312263111111e-29 * t) * t) * t) * t) * t) * t;
    }
    function p65(t) {
      return 0.24444156740777434 + (0.004585553051160578 + (45832466292683086e-21 + (3835275259003303e-22 + (26819103733055602e-25 + (15489984390884758e-27 + 7193320636444444e-29 * t) * t) * t) * t) * t) * t;
    }
    function p66(t) {
      return 0.25379911500634267 + (0.004773572320865003 + (48199253896534185e-21 + (40561404245564733e-23 + (28411932320871164e-25 + (1637470573645832e-26 + 7554137982222222e-29 * t) * t) * t) * t) * t) * t;
    }
    function p67(t) {
      return 0.26354234756393613 + (0.0049713289477083785 + (5070245503693037e-20 + (42901079254268185e-23 + (3009542205890048e-24 + (1730349702534734e-26 + 7927827336888888e-29 * t) * t) * t) * t) * t) * t;
    }
    function p68(t) {
      return 0.27369129607732345 + (0.005179384602305264 + (533501522583266e-19 + (4537920884886502e-22 + (3187405724581438e-24 + (1827790501024511e-26 + 8314418236444444e-29 * t) * t) * t) * t) * t) * t;
    }
    function p69(t) {
      return 0.28426714781640317 + (0.005398334191669514 + (5615088486525581e-20 + (4800358919649474e-22 + (33752476967570798e-25 + (19299477888083468e-27 + 8713904913777777e-29 * t) * t) * t) * t) * t) * t;
    }
    function p70(t) {
      return 0.2952923146534852 + (0.0056288077305420795 + (5911367118991331e-20 + (5078239378174484e-22 + (35735475025851714e-25 + (2036976093701707e-26 + 9126244261333333e-29 * t) * t) * t) * t) * t) * t;
    }
    function p71(t) {
      return 0.3067905052252884 + (0.00587147230327454 + (6224803160219768e-20 + (5372418576620094e-22 + (3782799941896024e-24 + (2149029193044454e-26 + 9551353918222223e-29 * t) * t) * t) * t) * t) * t;
    }
    function p72(t) {
      return 0.3187868011117332 + (0.00612703411923391 + (6556401225970764e-20 + (5683793028783774e-22 + (4003515135339238e-24 + (22662596341239295e-27 + 9989110976e-23 * t) * t) * t) * t) * t) * t;
    }
    function p73(t) {
      return 0.33130773722152623 + (0.006396240664679808 + (690722095929424e-19 + (6013300666188594e-22 + (4236218376588347e-24 + (23888182347073697e-27 + 10439349811555555e-29 * t) * t) * t) * t) * t) * t;
    }
    function p74(t) {
      return 0.34438138658041334 + (0.0066798829540414 + (7278379551860356e-20 + (636192204432288e-21 + (4481449933651445e-24 + (25168535651285476e-27 + 10901861383111111e-29 * t) * t) * t) * t) * t) * t;
    }
    function p75(t) {
      return 0.35803744972380175 + (0.006978797883488269 + (7671054337145482e-20 + (6730681530891739e-22 + (4739764797584523e-24 + (2650511414114305e-26 + 11376390933333332e-29 * t) * t) * t) * t) * t) * t;
    }
    function p76(t) {
      return 0.37230734890119727 + (0.007293870689646138 + (8086485454267072e-20 + (7120648471806269e-22 + (50117323769745884e-25 + (27899342394100073e-27 + 11862637614222222e-29 * t) * t) * t) * t) * t) * t;
    }
    function p77(t) {
      return 0.3872243273055545 + (0.00762603751625498 + (8525978581000461e-20 + (7532938330517133e-22 + (5297936136838812e-24 + (2935260605416409e-26 + 12360253370666666e-29 * t) * t) * t) * t) * t) * t;
    }
    function p78(t) {
      return 0.4028235535461694 + (0.007976288091502973 + (8990907734243825e-20 + (7968713796195619e-22 + (55989731807360405e-25 + (30866246101464866e-27 + 12868841946666668e-29 * t) * t) * t) * t) * t) * t;
    }
    function p79(t) {
      return 0.4191422315891379 + (0.008345668518695046 + (9482718135925016e-20 + (8429185856178314e-22 + (5915453775108349e-24 + (3244155303434747e-26 + 1338795794311111e-28 * t) * t) * t) * t) * t) * t;
    }
    function p80(t) {
      return 0.43621971639463786 + (0.00873528418282895 + (100029291420668e-18 + (8915614828021988e-22 + (624800081507886e-23 + (3407976098345888e-26 + 13917107176888888e-29 * t) * t) * t) * t) * t) * t;
    }
    function p81(t) {
      return 0.4540976354853433 + (0.009146302775554824 + (10553137232446167e-20 + (9429311346463863e-22 + (6597249231221996e-24 + (35782041795476564e-27 + 14455745872e-23 * t) * t) * t) * t) * t) * t;
    }
    function p82(t) {
      return 0.4728200166851233 + (0.009579957440886046 + (11135019058000067e-20 + (9971637300550903e-22 + (6963845336995697e-24 + (37549499088161346e-27 + 1500328071288889e-28 * t) * t) * t) * t) * t) * t;
    }
    function p83(t) {
      return 0.4924334222717984 + (0.010037550043909497 + (11750334542845235e-20 + (10544006716188967e-22 + (7348446116824222e-24 + (3938316232643575e-26 + 15559069118222223e-29 * t) * t) * t) * t) * t) * t;
    }
    function p84(t) {
      return 0.5129870897920926 + (0.010520454564612427 + (12400930037494997e-20 + (11147886579371265e-22 + (775171845505687e-23 + (41283980931872625e-27 + 1612241968e-22 * t) * t) * t) * t) * t) * t;
    }
    function p85(t) {
      return 0.5345330797910137 + (0.011030120618800727 + (1308874151957227e-19 + (11784797595374515e-22 + (8174338306304482e-24 + (43252818449517084e-27 + 1669259264e-22 * t) * t) * t) * t) * t) * t;
    }
    function p86(t) {
      return 0.557126430711693 + (0.011568077107929736 + (13815797838036652e-20 + (12456314879260905e-22 + (8616989807896932e-24 + (4529044681153965e-26 + 17268801084444443e-29 * t) * t) * t) * t) * t) * t;
    }
    function p87(t) {
      return 0.5808253212251933 + (0.012135935999503878 + (1458422399666584e-19 + (1316406857309571e-21 + (9080364335510602e-24 + (4739754071312462e-26 + 1785021160888889e-28 * t) * t) * t) * t) * t) * t;
    }
    function p88(t) {
      return 0.6056912402529337 + (0.01273539623952555 + (15396244472258864e-20 + (13909744385382817e-22 + (9565159503230623e-24 + (4957467212766904e-26 + 18435945564444444e-29 * t) * t) * t) * t) * t) * t;
    }
    function p89(t) {
      return 0.6317891649471572 + (0.013368247798287032 + (16254186562762076e-20 + (14695084048334055e-22 + (10072078109604152e-24 + (5182230499568071e-26 + 19025081422222223e-29 * t) * t) * t) * t) * t) * t;
    }
    function p90(t) {
      return 0.6591877468972532 + (0.014036375850601992 + (17160483760259707e-20 + (15521885688723188e-22 + (1060182703153528e-23 + (5414079010583752e-26 + 19616655146666667e-29 * t) * t) * t) * t) * t) * t;
    }
    function p91(t) {
      return 0.6879595068317443 + (0.014741765091365868 + (18117679143520433e-20 + (16392004108230584e-22 + (11155116068018043e-24 + (5653036019492569e-26 + 20209663662222222e-29 * t) * t) * t) * t) * t) * t;
    }
    function p92(t) {
      return 0.7181810380872997 + (0.015486504187117112 + (19128428784550924e-20 + (17307350969359975e-22 + (11732656736113608e-24 + (5899112528756384e-26 + 20803065333333334e-29 * t) * t) * t) * t) * t) * t;
    }
    function p93(t) {
      return 0.7499332191172625 + (0.016272790364044783 + (20195505163377912e-20 + (18269894883203348e-22 + (12335161021630225e-24 + (6152306831216908e-26 + 21395783431111112e-29 * t) * t) * t) * t) * t) * t;
    }
    function p94(t) {
      return 0.7833014353128349 + (0.01710293413265243 + (21321800585063328e-20 + (19281661395543912e-22 + (12963340087354342e-24 + (6412604099806635e-26 + 21986708942222223e-29 * t) * t) * t) * t) * t) * t;
    }
    function p95(t) {
      return 0.8183758104102381 + (0.017979364149044223 + (2251033059275313e-19 + (20344732868018175e-22 + (1361790294183995e-23 + (6679976008397248e-26 + 2257470126222222e-28 * t) * t) * t) * t) * t) * t;
    }
    function p96(t) {
      return 0.8552514477568512 + (0.01890463221254756 + (23764237370371255e-20 + (2146124825130639e-21 + (14299555071870523e-24 + (6954380386469418e-26 + 23158593688888887e-29 * t) * t) * t) * t) * t) * t;
    }
    function p97(t) {
      return 0.8940286817084994 + (0.0198814183991272 + (25086793128395994e-20 + (22633402747585233e-22 + (1500899704211653e-23 + (7235760907504394e-26 + 23737194737777777e-29 * t) * t) * t) * t) * t) * t;
    }
    function p98(t) {
      return 0.9348133394287079 + (0.02091253632978037 + (2648140346599848e-19 + (23863447359754924e-22 + (15746923065472183e-24 + (7524046814172015e-26 + 24309291271111114e-29 * t) * t) * t) * t) * t) * t;
    }
    function p99(t) {
      return 0.9777170133588503 + (0.02200093857283048 + (2795161070268238e-19 + (25153688325245316e-22 + (1651401954782282e-23 + (7819152682936823e-26 + 24873652355555557e-29 * t) * t) * t) * t) * t) * t;
    }
    function p100() {
      return 1;
    }
    function erfcxY100(y100) {
      var t = floor(y100);
      var f = table[t];
      return f(2 * y100 - (2 * t + 1));
    }
    module.exports = erfcxY100;
  }
});

// node_modules/@stdlib/math-base-special-erfcx/lib/main.js
var require_main86 = __commonJS({
  "node_modules/@stdlib/math-base-special-erfcx/lib/main.js"(exports, module) {
    "use strict";
    var exp9 = require_lib58();
    var PINF = require_lib31();
    var isnan = require_lib6();
    var erfcxY100 = require_erfcx_y100();
    var INV_SQRT_PI = 0.5641895835477563;
    function erfcx2(x) {
      var x2;
      if (isnan(x)) {
        return x;
      }
      if (x >= 0) {
        if (x > 50) {
          if (x > 5e7) {
            return INV_SQRT_PI / x;
          }
          x2 = x * x;
          return INV_SQRT_PI * (x2 * (x2 + 4.5) + 2) / (x * (x2 * (x2 + 5) + 3.75));
        }
        return erfcxY100(400 / (4 + x));
      }
      if (x < -26.7) {
        return PINF;
      }
      x2 = x * x;
      if (x < -6.1) {
        return 2 * exp9(x2);
      }
      return 2 * exp9(x2) - erfcxY100(400 / (4 - x));
    }
    module.exports = erfcx2;
  }
});

// node_modules/@stdlib/math-base-special-erfcx/lib/index.js
var require_lib124 = __commonJS({
  "node_modules/@stdlib/math-base-special-erfcx/lib/index.js"(exports, module) {
    "use strict";
    var main = require_main86();
    module.exports = main;
  }
});

// packages/metrology/src/canonical.ts
function canonicalText(value) {
  if (value === null || typeof value === "boolean") return String(value);
  if (typeof value === "number") {
    if (!Number.isFinite(value)) throw new TypeError("A number that is not finite has no canonical text.");
    return JSON.stringify(value);
  }
  if (typeof value === "string") {
    if (/\p{Surrogate}/u.test(value)) throw new TypeError("Text with a lone surrogate has no canonical text.");
    return JSON.stringify(value);
  }
  if (Array.isArray(value)) return `[${Array.from(value, canonicalText).join(",")}]`;
  if (typeof value === "object") {
    const members = Object.entries(value).filter(([, item]) => item !== void 0);
    members.sort(([a], [b]) => a < b ? -1 : a > b ? 1 : 0);
    return `{${members.map(([name, item]) => `${canonicalText(name)}:${canonicalText(item)}`).join(",")}}`;
  }
  throw new TypeError(`A ${typeof value} has no canonical text.`);
}

// packages/metrology/src/finish.ts
function finish(output) {
  const lost = [];
  const finished = tidy(output, "", lost);
  if (lost.length === 0) return finished;
  const warnings = lost.map((path) => ({
    code: "not-representable",
    message: `${path} is larger than a number can hold.`,
    path
  }));
  return { ...finished, warnings: [...finished.warnings, ...warnings] };
}
function tidy(value, path, lost) {
  if (typeof value === "number") {
    if (Number.isFinite(value)) return value === 0 ? 0 : value;
    lost.push(path);
    return null;
  }
  if (Array.isArray(value)) return value.map((item, index2) => tidy(item, `${path}[${index2}]`, lost));
  if (typeof value !== "object" || value === null) return value;
  const entries = Object.entries(value).filter(([, item]) => item !== void 0);
  return Object.fromEntries(
    entries.map(([name, item]) => [name, tidy(item, path ? `${path}.${name}` : name, lost)])
  );
}

// packages/metrology/src/input/invalid-input.ts
var InvalidInput = class extends Error {
  constructor(code, message, path) {
    super(message);
    this.code = code;
    this.path = path;
    this.name = "InvalidInput";
  }
  code;
  path;
};

// packages/metrology/src/decimal/bit-length.ts
function bitLength(value) {
  if (value === 0n) return 0;
  const hexadecimal = value.toString(16);
  return hexadecimal.length * 4 - 4 + (32 - Math.clz32(Number.parseInt(hexadecimal[0] ?? "0", 16)));
}

// packages/metrology/src/decimal/rational.ts
function powerOfTen(exponent) {
  return BigInt("1" + "0".repeat(exponent));
}
function decimalParts(value) {
  const [digits = "0", power = "0"] = String(value).split("e");
  const [whole = "0", fraction = ""] = digits.split(".");
  return { coefficient: BigInt(whole + fraction), exponent: Number(power) - fraction.length };
}
function rational(value) {
  const { coefficient, exponent } = decimalParts(value);
  return exponent >= 0 ? { numerator: coefficient * powerOfTen(exponent), denominator: 1n } : { numerator: coefficient, denominator: powerOfTen(-exponent) };
}
var add = (a, b) => ({
  numerator: a.numerator * b.denominator + b.numerator * a.denominator,
  denominator: a.denominator * b.denominator
});
var subtract = (a, b) => add(a, negate(b));
var negate = (a) => ({ numerator: -a.numerator, denominator: a.denominator });
var absolute = (a) => a.numerator < 0n ? negate(a) : a;
var multiply = (a, b) => ({
  numerator: a.numerator * b.numerator,
  denominator: a.denominator * b.denominator
});
function divide(a, b) {
  if (b.numerator === 0n) throw new RangeError("Division by zero in exact arithmetic.");
  const sign = b.numerator < 0n ? -1n : 1n;
  return { numerator: a.numerator * b.denominator * sign, denominator: a.denominator * b.numerator * sign };
}
function compare(a, b) {
  const left = a.numerator * b.denominator;
  const right = b.numerator * a.denominator;
  return left < right ? -1 : left > right ? 1 : 0;
}
function toNumber({ numerator, denominator }) {
  if (numerator === 0n) return 0;
  const negative = numerator < 0n;
  const magnitude = negative ? -numerator : numerator;
  const lead = bitLength(magnitude) - bitLength(denominator);
  let shift = Math.min(54 - lead, 1074);
  let [quotient, remainder] = shifted(magnitude, denominator, shift);
  const surplus = bitLength(quotient) - 53;
  if (surplus > 0) {
    shift -= surplus;
    [quotient, remainder] = shifted(magnitude, denominator, shift);
  }
  const divisor = shift >= 0 ? denominator : denominator << BigInt(-shift);
  const twice = remainder * 2n;
  if (twice > divisor || twice === divisor && quotient % 2n === 1n) quotient += 1n;
  const result = scaleByPowerOfTwo(Number(quotient), -shift);
  return negative ? -result : result;
}
function shifted(numerator, denominator, shift) {
  const top = shift >= 0 ? numerator << BigInt(shift) : numerator;
  const bottom = shift >= 0 ? denominator : denominator << BigInt(-shift);
  return [top / bottom, top % bottom];
}
function squareRoot({ numerator, denominator }) {
  if (numerator <= 0n) return 0;
  const lead = bitLength(numerator) - bitLength(denominator);
  const shift = 2 * Math.floor((128 - lead) / 2);
  const [quotient] = shifted(numerator, denominator, shift);
  const root = wholeRoot(quotient);
  return toNumber(
    shift >= 0 ? { numerator: root, denominator: 1n << BigInt(shift / 2) } : { numerator: root << BigInt(-shift / 2), denominator: 1n }
  );
}
function wholeRoot(value) {
  let root = BigInt(Math.floor(Math.sqrt(Number(value)))) + 1n;
  for (; ; ) {
    const next = (root + value / root) / 2n;
    if (next === root || next === root + 1n) break;
    root = next;
  }
  while (root * root > value) root -= 1n;
  while ((root + 1n) * (root + 1n) <= value) root += 1n;
  return root;
}
function scaleByPowerOfTwo(value, power) {
  const half = Math.trunc(power / 2);
  return value * powerOfTwo(half) * powerOfTwo(power - half);
}
function powerOfTwo(power) {
  let result = 1;
  let square = power < 0 ? 0.5 : 2;
  for (let left = Math.abs(power); left > 0; left = Math.floor(left / 2)) {
    if (left % 2 === 1) result *= square;
    if (left > 1) square *= square;
  }
  return result;
}

// packages/metrology/src/decimal/scaled.ts
function scale(values) {
  const parts = values.map(decimalParts);
  let exponent = 0;
  let first = true;
  for (const part of parts) {
    if (part.coefficient === 0n) continue;
    if (first || part.exponent < exponent) exponent = part.exponent;
    first = false;
  }
  const integers = parts.map(
    (part) => part.coefficient === 0n || part.exponent === exponent ? part.coefficient : part.coefficient * powerOfTen(part.exponent - exponent)
  );
  return { integers, exponent };
}

// packages/metrology/src/input/common.ts
function readCommon(reader) {
  return {
    ...given("unit", reader.optionalText("unit")),
    ...given("tolerance", readTolerance(reader)),
    ...given("processStandardDeviation", reader.optionalNumber("processStandardDeviation", { above: 0 })),
    ...given("resolution", reader.optionalNumber("resolution", { above: 0 })),
    ...given("margin", reader.optionalNumber("margin", { above: 0 })),
    confidence: reader.optionalNumber("confidence", { above: 0, below: 1 }) ?? 0.95,
    coverageFactor: reader.optionalNumber("coverageFactor", { above: 0 }) ?? 2,
    sigmas: reader.optionalNumber("sigmas", { above: 0 }) ?? 6
  };
}
function characteristicOf(common2) {
  return {
    unit: common2.unit ?? "",
    ...given("tolerance", common2.tolerance),
    ...given("processStandardDeviation", common2.processStandardDeviation),
    ...given("resolution", common2.resolution)
  };
}
function readTolerance(reader) {
  const source = reader.optionalObject("tolerance");
  if (!source) return void 0;
  const lower = source.optionalNumber("lower");
  const upper = source.optionalNumber("upper");
  if (lower === void 0 && upper === void 0) {
    throw new InvalidInput("missing", "Give a lower limit, an upper limit or both.", reader.at("tolerance"));
  }
  if (lower !== void 0 && upper !== void 0 && compare(rational(lower), rational(upper)) >= 0) {
    throw new InvalidInput(
      "limits-inverted",
      `The lower limit (${lower}) must be below the upper limit (${upper}).`,
      reader.at("tolerance")
    );
  }
  return { ...given("lower", lower), ...given("upper", upper) };
}
function given(name, value) {
  return value === void 0 ? {} : { [name]: value };
}

// packages/metrology/src/input/reader.ts
var Reader = class _Reader {
  constructor(source, path, root = null) {
    this.source = source;
    this.path = path;
    this.root = root;
    ;
    (root ?? this).all.push(this);
  }
  source;
  path;
  root;
  known = /* @__PURE__ */ new Set();
  all = [];
  static of(value, path = "") {
    return new _Reader(asObject(value, path), path);
  }
  at(name) {
    if (typeof name === "number") return `${this.path}[${name}]`;
    return this.path ? `${this.path}.${name}` : name;
  }
  has(name) {
    return this.value(name) !== void 0;
  }
  /** The raw value; undefined where it is missing or null. */
  value(name) {
    this.known.add(name);
    const value = Object.prototype.hasOwnProperty.call(this.source, name) ? this.source[name] : void 0;
    return value === null ? void 0 : value;
  }
  required(name) {
    const value = this.value(name);
    if (value === void 0) throw new InvalidInput("missing", `Give ${name}.`, this.at(name));
    return value;
  }
  number(name, bounds = {}) {
    return asNumber(this.required(name), this.at(name), bounds);
  }
  optionalNumber(name, bounds = {}) {
    const value = this.value(name);
    return value === void 0 ? void 0 : asNumber(value, this.at(name), bounds);
  }
  integer(name, bounds = {}) {
    return asInteger(this.required(name), this.at(name), bounds);
  }
  optionalInteger(name, bounds = {}) {
    const value = this.value(name);
    return value === void 0 ? void 0 : asInteger(value, this.at(name), bounds);
  }
  boolean(name) {
    const value = this.required(name);
    if (typeof value === "boolean") return value;
    throw new InvalidInput("not-a-boolean", "Write true or false here.", this.at(name));
  }
  text(name) {
    return asText(this.required(name), this.at(name));
  }
  optionalText(name) {
    const value = this.value(name);
    return value === void 0 ? void 0 : asText(value, this.at(name));
  }
  choice(name, choices) {
    const value = asText(this.required(name), this.at(name));
    const found = choices.find((choice) => choice === value);
    if (found !== void 0) return found;
    throw new InvalidInput("not-a-choice", `Choose one of ${choices.join(", ")}.`, this.at(name));
  }
  object(name) {
    return this.child(this.required(name), this.at(name));
  }
  optionalObject(name) {
    const value = this.value(name);
    return value === void 0 ? void 0 : this.child(value, this.at(name));
  }
  /** Stands for an object that was not given. */
  empty(name) {
    return this.child({}, this.at(name));
  }
  numbers(name, least, bounds = {}) {
    const path = this.at(name);
    const list = asList(this.required(name), path, least);
    return list.map((value, index2) => asNumber(value, `${path}[${index2}]`, bounds));
  }
  objects(name, least) {
    const path = this.at(name);
    const list = asList(this.required(name), path, least);
    return list.map((value, index2) => this.child(value, `${path}[${index2}]`));
  }
  /** Leaves the rest of this object unread on purpose: it is an output of ours, of which only a part is needed. */
  ignoreRest() {
    for (const name of Object.keys(this.source)) this.known.add(name);
    return this;
  }
  /** Paths of given fields that nothing asked for, in this object and in those read through it. */
  unknownFields() {
    return (this.root ?? this).all.flatMap(
      (reader) => Object.keys(reader.source).filter((name) => !reader.known.has(name)).map((name) => reader.at(name))
    );
  }
  child(value, path) {
    return new _Reader(asObject(value, path), path, this.root ?? this);
  }
};
function asObject(value, path) {
  if (typeof value === "object" && value !== null && !Array.isArray(value))
    return value;
  throw new InvalidInput("not-an-object", `Write an object here, not ${describe(value)}.`, path);
}
function asList(value, path, least) {
  if (!Array.isArray(value)) {
    throw new InvalidInput("not-a-list", `Write a list here, not ${describe(value)}.`, path);
  }
  if (value.length < least) {
    throw new InvalidInput("too-few", `Give at least ${least} here; there are ${value.length}.`, path);
  }
  if (value.length > 1e6) {
    throw new InvalidInput("too-many", `Give at most 1,000,000 here; there are ${value.length}.`, path);
  }
  return Array.from(value);
}
function asNumber(value, path, bounds = {}) {
  if (typeof value !== "number") {
    throw new InvalidInput("not-a-number", `Write a number here, not ${describe(value)}.`, path);
  }
  if (!Number.isFinite(value)) {
    throw new InvalidInput("not-finite", "Write a number that is not too large to be computed with.", path);
  }
  const { above, least, below: below2, most } = bounds;
  if (above !== void 0 && value <= above) throw outside("too-small", `above ${above}`, value, path);
  if (least !== void 0 && value < least) throw outside("too-small", `at least ${least}`, value, path);
  if (below2 !== void 0 && value >= below2) throw outside("too-large", `below ${below2}`, value, path);
  if (most !== void 0 && value > most) throw outside("too-large", `at most ${most}`, value, path);
  return value;
}
function asInteger(value, path, bounds) {
  const number = asNumber(value, path, bounds);
  if (Number.isSafeInteger(number)) return number;
  throw new InvalidInput("not-an-integer", `Write a whole number here, not ${number}.`, path);
}
function asText(value, path) {
  if (typeof value === "string") return value;
  throw new InvalidInput("not-text", `Write text here, not ${describe(value)}.`, path);
}
function outside(code, wanted, value, path) {
  return new InvalidInput(code, `The number must be ${wanted}; it is ${value}.`, path);
}
function describe(value) {
  if (value === void 0 || value === null) return "nothing";
  if (Array.isArray(value)) return "a list";
  if (typeof value === "string") return `text (“${value.length > 20 ? `${value.slice(0, 20)}…` : value}”)`;
  if (typeof value === "object") return "an object";
  return `${String(value)}`;
}

// packages/metrology/src/distributions/incomplete-beta.ts
var import_math_base_special_betainc = __toESM(require_lib122(), 1);
var import_math_base_special_exp = __toESM(require_lib58(), 1);
var import_math_base_special_ln2 = __toESM(require_lib95(), 1);

// packages/metrology/src/distributions/find-root.ts
function findRoot(f, low, high, relative = 23e-17) {
  let [a, b] = [low, high];
  let [fa, fb] = [f(a), f(b)];
  let [c, fc] = [a, fa];
  let step = b - a;
  let previous = step;
  for (let i = 0; i < 200 && fb !== 0; i++) {
    if (fb > 0 === fc > 0) {
      ;
      [c, fc] = [a, fa];
      step = previous = b - a;
    }
    if (Math.abs(fc) < Math.abs(fb)) {
      ;
      [a, b, c] = [b, c, b];
      [fa, fb, fc] = [fb, fc, fb];
    }
    const tolerance = relative * Math.abs(b) + 1e-300;
    const middle = 0.5 * (c - b);
    if (Math.abs(middle) <= tolerance) break;
    const proposed = interpolated(a, b, c, fa, fb, fc, middle, previous, tolerance);
    previous = proposed === null ? middle : step;
    step = proposed ?? middle;
    [a, fa] = [b, fb];
    b += Math.abs(step) > tolerance ? step : middle > 0 ? tolerance : -tolerance;
    fb = f(b);
  }
  return b;
}
function interpolated(a, b, c, fa, fb, fc, middle, previous, tolerance) {
  if (Math.abs(previous) < tolerance || Math.abs(fa) <= Math.abs(fb)) return null;
  const s = fb / fa;
  let p;
  let q;
  if (a === c) {
    p = 2 * middle * s;
    q = 1 - s;
  } else {
    const r = fb / fc;
    const t = fa / fc;
    p = s * (2 * middle * t * (t - r) - (b - a) * (r - 1));
    q = (t - 1) * (r - 1) * (s - 1);
  }
  if (p > 0) q = -q;
  else p = -p;
  const fits = 2 * p < Math.min(3 * middle * q - Math.abs(tolerance * q), Math.abs(previous * q));
  return fits ? p / q : null;
}
function findRisingRoot(f, guess, width, relative) {
  let [low, high] = [guess - width, guess + width];
  let reach2 = width;
  for (let i = 0; i < 1100 && !(f(low) <= 0); i++) {
    high = low;
    low -= reach2 *= 2;
  }
  reach2 = width;
  for (let i = 0; i < 1100 && !(f(high) >= 0); i++) {
    low = high;
    high += reach2 *= 2;
  }
  return findRoot(f, low, high, relative);
}

// packages/metrology/src/distributions/normal.ts
var import_math_base_special_erfc = __toESM(require_lib104(), 1);
var import_math_base_special_erfcinv = __toESM(require_lib123(), 1);
var import_math_base_special_erfcx = __toESM(require_lib124(), 1);
var import_math_base_special_ln = __toESM(require_lib95(), 1);
var rootHalf = Math.sqrt(0.5);
var rootTwo = Math.SQRT2;
function normalCdf(z) {
  return 0.5 * (0, import_math_base_special_erfc.default)(-z * rootHalf);
}
function normalUpperTail(z) {
  return normalCdf(-z);
}
function logNormalCdf(z) {
  if (z > -5) return (0, import_math_base_special_ln.default)(normalCdf(z));
  return (0, import_math_base_special_ln.default)(0.5 * (0, import_math_base_special_erfcx.default)(-z * rootHalf)) - 0.5 * z * z;
}
function normalHazard(z) {
  const scaled = (0, import_math_base_special_erfcx.default)(-z * rootHalf);
  return Number.isFinite(scaled) ? rootTwoOverPi / scaled : 0;
}
var rootTwoOverPi = 0.7978845608028654;
function normalQuantile(p) {
  return p <= 0.5 ? -rootTwo * (0, import_math_base_special_erfcinv.default)(2 * p) : rootTwo * (0, import_math_base_special_erfcinv.default)(2 * (1 - p));
}

// packages/metrology/src/distributions/incomplete-beta.ts
function betaTails(odds, a, b) {
  if (odds <= 0) return { lower: 0, upper: 1 };
  if (odds === Infinity) return { lower: 1, upper: 0 };
  if (odds <= 1) {
    const x = odds / (1 + odds);
    return { lower: (0, import_math_base_special_betainc.default)(x, a, b), upper: (0, import_math_base_special_betainc.default)(x, a, b, true, true) };
  }
  const y = 1 / (1 + odds);
  return { lower: (0, import_math_base_special_betainc.default)(y, b, a, true, true), upper: (0, import_math_base_special_betainc.default)(y, b, a) };
}
function betaQuantileOdds(lower, upper, a, b) {
  const useLower = lower <= upper;
  const target = (0, import_math_base_special_ln2.default)(useLower ? lower : upper);
  const gap = (logOdds) => {
    const tails = betaTails((0, import_math_base_special_exp.default)(logOdds), a, b);
    const value = useLower ? (0, import_math_base_special_ln2.default)(tails.lower) - target : target - (0, import_math_base_special_ln2.default)(tails.upper);
    return value;
  };
  const width = Math.sqrt(1 / a + 1 / b);
  const z = useLower ? normalQuantile(lower) : -normalQuantile(upper);
  return (0, import_math_base_special_exp.default)(findRisingRoot(gap, (0, import_math_base_special_ln2.default)(a / b) + z * width, 0.1 * width));
}

// packages/metrology/src/distributions/beta.ts
function betaDistributionTails(x, a, b) {
  if (x <= 0) return { lower: 0, upper: 1 };
  if (x >= 1) return { lower: 1, upper: 0 };
  return betaTails(x / (1 - x), a, b);
}
function betaQuantile(p, a, b) {
  const odds = betaQuantileOdds(p, 1 - p, a, b);
  return odds === Infinity ? 1 : odds / (1 + odds);
}

// packages/metrology/src/distributions/chi-density.ts
var import_math_base_special_exp3 = __toESM(require_lib58(), 1);
var import_math_base_special_ln4 = __toESM(require_lib95(), 1);

// packages/metrology/src/distributions/scaled-gamma.ts
var import_math_base_special_exp2 = __toESM(require_lib58(), 1);
var import_math_base_special_gamma = __toESM(require_lib89(), 1);
var import_math_base_special_ln3 = __toESM(require_lib95(), 1);
function scaledGamma(a) {
  if (a >= 10) {
    const r = 1 / (a * a);
    const series = 1 / 12 - r * (1 / 360 - r * (1 / 1260 - r * (1 / 1680 - r * (1 / 1188 - r * 691 / 360360))));
    return (0, import_math_base_special_exp2.default)(series / a);
  }
  return (0, import_math_base_special_gamma.default)(a) * Math.sqrt(a / twoPi) * (0, import_math_base_special_exp2.default)(a * (1 - (0, import_math_base_special_ln3.default)(a)));
}
var twoPi = 6.283185307179586;

// packages/metrology/src/distributions/chi-density.ts
function logChiShape(v, df) {
  return df * ((0, import_math_base_special_ln4.default)(v) - 0.5 * (v - 1) * (v + 1)) - (0, import_math_base_special_ln4.default)(v);
}
function chiConstant(df) {
  return Math.sqrt(df / pi) / scaledGamma(df / 2);
}
var pi = 3.141592653589793;

// packages/metrology/src/distributions/chi-square.ts
var import_math_base_special_exp5 = __toESM(require_lib58(), 1);
var import_math_base_special_ln6 = __toESM(require_lib95(), 1);

// packages/metrology/src/distributions/incomplete-gamma.ts
var import_math_base_special_exp4 = __toESM(require_lib58(), 1);
var import_math_base_special_gammainc = __toESM(require_lib115(), 1);
var import_math_base_special_ln5 = __toESM(require_lib95(), 1);
var import_math_base_special_log1pmx = __toESM(require_lib108(), 1);
var ownFrom = 100;
function gammaTails(a, x) {
  if (x <= 0) return { lower: 0, upper: 1 };
  if (x === Infinity) return { lower: 1, upper: 0 };
  if (a < ownFrom) return { lower: (0, import_math_base_special_gammainc.default)(x, a), upper: (0, import_math_base_special_gammainc.default)(x, a, true, true) };
  const prefix = gammaPrefix(a, x);
  if (x < a + 1) {
    const lower = prefix * lowerSeries(a, x);
    return { lower, upper: 1 - lower };
  }
  const upper = prefix * upperFraction(a, x);
  return { lower: 1 - upper, upper };
}
function gammaPrefix(a, x) {
  const ratio = x / a;
  const exponent = ratio < 0.25 ? (0, import_math_base_special_ln5.default)(ratio) - (ratio - 1) : (0, import_math_base_special_log1pmx.default)((x - a) / a);
  return Math.sqrt(a / twoPi2) * (0, import_math_base_special_exp4.default)(a * exponent) / scaledGamma(a);
}
function lowerSeries(a, x) {
  let term = 1 / a;
  let sum = term;
  for (let k = 1; term > sum * 1e-17; k++) {
    term *= x / (a + k);
    sum += term;
  }
  return sum;
}
function upperFraction(a, x) {
  let b = x + 1 - a;
  let d = 1 / b;
  let c = 1e300;
  let result = d;
  for (let i = 1; i < 1e6; i++) {
    const numerator = -i * (i - a);
    b += 2;
    d = 1 / (numerator * d + b);
    c = b + numerator / c;
    const change = c * d;
    result *= change;
    if (Math.abs(change - 1) < 1e-16) break;
  }
  return result;
}
var twoPi2 = 6.283185307179586;

// packages/metrology/src/distributions/chi-square.ts
function chiSquareTails(x, df) {
  return gammaTails(df / 2, x / 2);
}
function chiSquareQuantile(p, df) {
  const useLower = p <= 0.5;
  const target = (0, import_math_base_special_ln6.default)(useLower ? p : 1 - p);
  const gap = (logX) => {
    const tails = chiSquareTails((0, import_math_base_special_exp5.default)(logX), df);
    return useLower ? (0, import_math_base_special_ln6.default)(tails.lower) - target : target - (0, import_math_base_special_ln6.default)(tails.upper);
  };
  const spread = 2 / (9 * df);
  const root = 1 - spread + normalQuantile(p) * Math.sqrt(spread);
  const guess = (0, import_math_base_special_ln6.default)(df) + 3 * (0, import_math_base_special_ln6.default)(Math.max(root, 0.05));
  return (0, import_math_base_special_exp5.default)(findRisingRoot(gap, guess, 0.01 * Math.sqrt(2 / df)));
}

// packages/metrology/src/distributions/f.ts
function fTails(x, df1, df2) {
  return betaTails(df1 / df2 * x, df1 / 2, df2 / 2);
}
function fQuantile(p, df1, df2) {
  return df2 / df1 * betaQuantileOdds(p, 1 - p, df1 / 2, df2 / 2);
}

// packages/metrology/src/distributions/noncentral-t.ts
var import_math_base_special_exp6 = __toESM(require_lib58(), 1);
var import_math_base_special_ln7 = __toESM(require_lib95(), 1);

// packages/metrology/src/distributions/gauss-legendre.ts
var nodes = [
  [0.09501250983763744, 0.1894506104550685],
  [0.2816035507792589, 0.18260341504492358],
  [0.45801677765722737, 0.16915651939500254],
  [0.6178762444026438, 0.14959598881657674],
  [0.755404408355003, 0.12462897125553388],
  [0.8656312023878318, 0.09515851168249279],
  [0.9445750230732326, 0.062253523938647894],
  [0.9894009349916499, 0.027152459411754096]
];
function integratePanel(f, lower, upper) {
  const center = 0.5 * (lower + upper);
  const half = 0.5 * (upper - lower);
  let sum = 0;
  for (const [node, weight] of nodes) sum += weight * (f(center - half * node) + f(center + half * node));
  return half * sum;
}
function integrate(f, breakPoints) {
  let sum = 0;
  for (let i = 1; i < breakPoints.length; i++) {
    sum += integratePanel(f, breakPoints[i - 1], breakPoints[i]);
  }
  return sum;
}

// packages/metrology/src/distributions/student-t.ts
function tTails(t, df) {
  const scaled = t / Math.sqrt(df);
  const beyond = 0.5 * betaTails(scaled * scaled, 0.5, df / 2).upper;
  return t < 0 ? { lower: beyond, upper: 1 - beyond } : { lower: 1 - beyond, upper: beyond };
}
function tTwoSided(t, df) {
  const scaled = t / Math.sqrt(df);
  return betaTails(scaled * scaled, 0.5, df / 2).upper;
}
function tQuantile(p, df) {
  if (p === 0.5) return 0;
  const tail = p < 0.5 ? p : 1 - p;
  const odds = betaQuantileOdds(2 * Math.abs(0.5 - p), 2 * tail, 0.5, df / 2);
  const size = Math.sqrt(df) * Math.sqrt(odds);
  return p < 0.5 ? -size : size;
}

// packages/metrology/src/distributions/noncentral-t.ts
function noncentralTTails(t, df, noncentrality) {
  if (noncentrality === 0) return tTails(t, df);
  const lower = below(t, df, noncentrality);
  if (lower <= 0.5) return { lower, upper: 1 - lower };
  const upper = below(-t, df, -noncentrality);
  return { lower: 1 - upper, upper };
}
function below(t, df, shift) {
  const height = (u) => {
    const v = (0, import_math_base_special_exp6.default)(u);
    return logChiShape(v, df) + u + logNormalCdf(t * v - shift);
  };
  const slope = (u) => {
    const v = (0, import_math_base_special_exp6.default)(u);
    return df * (1 - v) * (1 + v) + t * v * normalHazard(t * v - shift);
  };
  const peak = findRisingRoot((u) => -slope(u), 0, 0.5, 1e-3);
  const top = height(peak);
  if (top < -2e3) return 0;
  const left = fallPoint(height, peak, -1 / Math.sqrt(df));
  const right = fallPoint(height, peak, 1 / Math.sqrt(df));
  const points = [...panels(left, peak, 7), ...panels(peak, right, 5), right];
  const width = Math.min(peak - left, right - peak) / 5;
  const sharp = transitionPoints(t, shift, left, right, width);
  const ascending = [...points, ...sharp].sort((a, b) => a - b);
  const area = integrate((u) => (0, import_math_base_special_exp6.default)(height(u) - top), ascending);
  return (0, import_math_base_special_exp6.default)(top + (0, import_math_base_special_ln7.default)(area * chiConstant(df)));
}
function fallPoint(height, peak, step) {
  const floor = height(peak) - 42;
  let inner = 0;
  let outer = step;
  while (height(peak + outer) > floor) {
    inner = outer;
    outer *= 2;
  }
  for (let i = 0; i < 12; i++) {
    const middle = 0.5 * (inner + outer);
    if (height(peak + middle) > floor) inner = middle;
    else outer = middle;
  }
  return peak + outer;
}
function panels(from, to, count) {
  return Array.from({ length: count }, (_, i) => from + (to - from) * i / count);
}
function transitionPoints(t, shift, left, right, width) {
  const points = [];
  for (let x = -9; x <= 9; x += 1.5) {
    const v = (x + shift) / t;
    if (!(v > 0)) continue;
    const u = (0, import_math_base_special_ln7.default)(v);
    if (u > left && u < right && 1.5 / Math.abs(t * v) < width) points.push(u);
  }
  return points;
}
function smallTail(p) {
  const useLower = p <= 0.5;
  if (Math.min(p, 1 - p) > 0.4) {
    return (t, df, noncentrality) => {
      const { lower, upper } = noncentralTTails(t, df, noncentrality);
      return useLower ? lower : upper;
    };
  }
  return useLower ? below : (t, df, noncentrality) => below(-t, df, -noncentrality);
}
function noncentralTQuantile(p, df, noncentrality) {
  if (noncentrality === 0) return tQuantile(p, df);
  const useLower = p <= 0.5;
  const target = (0, import_math_base_special_ln7.default)(useLower ? p : 1 - p);
  const tail = smallTail(p);
  const gap = (t) => useLower ? (0, import_math_base_special_ln7.default)(tail(t, df, noncentrality)) - target : target - (0, import_math_base_special_ln7.default)(tail(t, df, noncentrality));
  const width = Math.sqrt(1 + 0.5 * noncentrality * noncentrality / df);
  return findRisingRoot(gap, noncentrality + normalQuantile(p) * width, 0.2 * width);
}
function noncentralityAt(t, df, p) {
  if (Math.abs(t) > 1e7) return t * Math.sqrt(chiSquareQuantile(t > 0 ? 1 - p : p, df) / df);
  const useLower = p <= 0.5;
  const target = (0, import_math_base_special_ln7.default)(useLower ? p : 1 - p);
  const tail = smallTail(p);
  const gap = (noncentrality) => useLower ? target - (0, import_math_base_special_ln7.default)(tail(t, df, noncentrality)) : (0, import_math_base_special_ln7.default)(tail(t, df, noncentrality)) - target;
  const width = Math.sqrt(1 + 0.5 * t * t / df);
  return findRisingRoot(gap, t - normalQuantile(p) * width, 0.2 * width, 1e-13);
}

// packages/metrology/src/distributions/studentized-range.ts
var import_math_base_special_exp7 = __toESM(require_lib58(), 1);
var import_math_base_special_ln8 = __toESM(require_lib95(), 1);
function studentizedRangeTails(q, groups, df) {
  if (!(q > 0)) return { lower: 0, upper: 1 };
  const upper = overSpread((w) => rangeUpperTail(w, groups), q, df);
  if (upper <= 0.5) return { lower: 1 - upper, upper };
  const lower = overSpread((w) => rangeCdf(w, groups), q, df);
  return { lower, upper: 1 - lower };
}
function studentizedRangeQuantile(p, groups, df) {
  const useLower = p <= 0.5;
  const target = (0, import_math_base_special_ln8.default)(useLower ? p : 1 - p);
  const gap = (logQ) => {
    const tails = studentizedRangeTails((0, import_math_base_special_exp7.default)(logQ), groups, df);
    return useLower ? (0, import_math_base_special_ln8.default)(tails.lower) - target : target - (0, import_math_base_special_ln8.default)(tails.upper);
  };
  return (0, import_math_base_special_exp7.default)(findRisingRoot(gap, 1, 0.5, 1e-11));
}
function overSpread(tail, q, df) {
  const height = (u) => {
    const v = (0, import_math_base_special_exp7.default)(u);
    const chance = tail(q * v);
    return chance > 0 ? logChiShape(v, df) + u + (0, import_math_base_special_ln8.default)(chance) : -Infinity;
  };
  const step = 1 / Math.sqrt(df);
  const { peak, top } = climb(height, Math.min(0, (0, import_math_base_special_ln8.default)(10 / q)), step);
  if (!(top > -700)) return 0;
  const left = fall(height, peak, top, -step);
  const right = fall(height, peak, top, step);
  const towards = (end, count) => Array.from({ length: count }, (_, i) => peak + (end - peak) * squared((i + 1) / count));
  const points = [...towards(left, 8).reverse(), peak, ...towards(right, 6)];
  return chiConstant(df) * (0, import_math_base_special_exp7.default)(top) * integrate((u) => (0, import_math_base_special_exp7.default)(height(u) - top), points);
}
function climb(height, from, width) {
  let peak = from;
  let top = height(from);
  for (let step = width; step > 0.05 * width; ) {
    const next = [peak - step, peak + step].map((u) => ({ u, height: height(u) }));
    const best = next.reduce((a, b) => b.height > a.height ? b : a);
    if (best.height > top) {
      peak = best.u;
      top = best.height;
      step *= 2;
    } else {
      step /= 2;
    }
    if (Math.abs(peak) > 700) break;
  }
  return { peak, top };
}
function fall(height, peak, top, step) {
  let inner = 0;
  let outer = step;
  for (let i = 0; i < 60 && height(peak + outer) > top - 30; i++) {
    inner = outer;
    outer *= 2;
  }
  for (let i = 0; i < 6; i++) {
    const middle = 0.5 * (inner + outer);
    if (height(peak + middle) > top - 30) inner = middle;
    else outer = middle;
  }
  return peak + outer;
}
function rangeCdf(w, groups) {
  const inner = (z) => density(z) * wholePower(between(z, w), groups - 1);
  return Math.min(1, groups * integrate(inner, largestValue(w)));
}
function rangeUpperTail(w, groups) {
  const inner = (z) => {
    const all = normalCdf(z);
    const below2 = normalCdf(z - w);
    const near = between(z, w);
    let sum = 0;
    for (let i = 0, power = 1; i < groups - 1; i++) {
      sum = sum * near + power;
      power *= all;
    }
    return density(z) * below2 * sum;
  };
  return Math.min(1, groups * integrate(inner, largestValue(w)));
}
function between(z, w) {
  if (w < 1e-3) {
    const middle = z - 0.5 * w;
    return w * density(middle) * (1 + w * w * (middle * middle - 1) / 24);
  }
  return z - w > 0 ? normalCdf(w - z) - normalCdf(-z) : normalCdf(z) - normalCdf(z - w);
}
function largestValue(w) {
  const from = Math.min(-9, 0.5 * w - 9);
  const to = Math.max(9, 0.5 * w + 9);
  const count = Math.ceil((to - from) / 1.5);
  return Array.from({ length: count + 1 }, (_, i) => from + (to - from) * i / count);
}
function wholePower(base, power) {
  let result = 1;
  for (let square = base, left = power; left > 0; left = Math.floor(left / 2)) {
    if (left % 2 === 1) result *= square;
    square *= square;
  }
  return result;
}
var density = (z) => 0.3989422804014327 * (0, import_math_base_special_exp7.default)(-0.5 * z * z);
var squared = (value) => value * value;

// packages/metrology/src/statistics/data-checks.ts
function dataChecks(readings, of, resolution) {
  const deviations = of.deviations();
  const spread = rootMeanSquare(deviations, of.n - 1);
  return [
    fewReadings(of.n),
    fewDistinctValues(readings),
    resolutionAboveSpread(of.standardDeviation, resolution),
    autocorrelation(of),
    outlyingReadings(deviations, spread),
    drift(deviations)
  ].filter((warning) => warning !== null);
}
var rootMeanSquare = (values, divisor) => Math.sqrt(values.reduce((sum, value) => sum + value * value, 0) / divisor);
function fewReadings(n) {
  if (n >= 10) return null;
  return {
    code: "few-readings",
    message: `There are only ${n} readings; at least 10 are common practice.`,
    figures: { n, usual: 10 }
  };
}
function fewDistinctValues(readings) {
  const distinct = new Set(readings).size;
  if (readings.length <= 3 || distinct > 3) return null;
  return {
    code: "few-distinct-values",
    message: `The ${readings.length} readings take only ${distinct} different values.`,
    figures: { distinct }
  };
}
function resolutionAboveSpread(standardDeviation, resolution) {
  if (resolution === void 0 || standardDeviation === null || resolution <= standardDeviation) return null;
  return {
    code: "resolution-above-spread",
    message: `The resolution (${resolution}) is larger than the standard deviation of the readings.`,
    figures: { resolution, standardDeviation }
  };
}
function autocorrelation({ n, lag1Autocorrelation }) {
  const limit = 2 / Math.sqrt(n);
  if (lag1Autocorrelation === null || Math.abs(lag1Autocorrelation) <= limit) return null;
  return {
    code: "autocorrelation",
    message: "Neighbouring readings are alike or opposed: they are not independent, and the interval is too short.",
    figures: { lag1Autocorrelation, limit }
  };
}
function outlyingReadings(deviations, spread) {
  const n = deviations.length;
  if (n < 3) return null;
  const t = tQuantile(5e-3 / n, n - 2);
  const limit = (n - 1) / Math.sqrt(n) * Math.sqrt(t * t / (n - 2 + t * t));
  const readings = deviations.flatMap(
    (deviation, index2) => Math.abs(deviation) > limit * spread ? [index2] : []
  );
  if (readings.length === 0) return null;
  return {
    code: "outlying-reading",
    message: `Far from the others: reading ${readings.map((index2) => index2 + 1).join(", ")}.`,
    readings,
    figures: { limit }
  };
}
function drift(deviations) {
  const n = deviations.length;
  if (n < 5) return null;
  const middle = (n - 1) / 2;
  let products = 0;
  let squares = 0;
  deviations.forEach((deviation, index2) => {
    products += deviation * (index2 - middle);
    squares += deviation * deviation;
  });
  const orderSquares = n * (n - 1) * (n + 1) / 12;
  const explained = products * products / orderSquares;
  const residual = Math.max(0, squares - explained);
  const t = residual > 0 ? Math.sqrt(explained * (n - 2) / residual) : Infinity;
  const pValue = tTwoSided(t, n - 2);
  if (pValue >= 0.01) return null;
  return {
    code: "drift",
    message: `The readings ${products > 0 ? "rise" : "fall"} over the order in which they were taken.`,
    figures: { pValue, direction: products > 0 ? 1 : -1 }
  };
}

// packages/metrology/src/statistics/mean-interval.ts
var complement = (value) => toNumber(subtract(rational(1), rational(value)));
var twoSidedCritical = (alpha, df) => oneSidedCritical(alpha / 2, df);
var oneSidedCritical = (alpha, df) => -tQuantile(Math.max(alpha, Number.MIN_VALUE), df);
var intervalAround = (center, halfWidth) => ({
  lower: center - halfWidth,
  upper: center + halfWidth
});
function positionAgainstMargin(center, halfWidth, margin) {
  const room = toNumber(subtract(rational(margin), absolute(rational(center))));
  if (halfWidth <= room) return "inside";
  return room < -halfWidth ? "outside" : "crosses";
}
function eatsMargin(standardUncertainty, factor, margin) {
  return compare(multiply(rational(factor), rational(standardUncertainty)), rational(margin)) >= 0;
}

// packages/metrology/src/statistics/moments.ts
function moments(readings) {
  const { integers, exponent } = scale(readings);
  const n = BigInt(integers.length);
  const first = integers[0] ?? 0n;
  const shifted2 = integers.map((value) => value - first);
  let sum = 0n;
  let squares = 0n;
  let minimum = readings[0] ?? 0;
  let maximum = minimum;
  for (const value of shifted2) {
    sum += value;
    squares += value * value;
  }
  for (const reading of readings) {
    if (reading < minimum) minimum = reading;
    if (reading > maximum) maximum = reading;
  }
  const mean = inUnits(sum + first * n, n, exponent);
  const spread = n * squares - sum * sum;
  const variance = n > 1n ? inUnits(spread, n * (n - 1n), 2 * exponent) : null;
  return {
    n: integers.length,
    mean,
    variance,
    standardDeviation: variance ? squareRoot(variance) : null,
    lag1Autocorrelation: spread > 0n ? lag1(shifted2, sum, n, spread) : null,
    minimum,
    maximum,
    deviations: () => inCommonUnit(shifted2.map((value) => n * value - sum))
  };
}
function inCommonUnit(values) {
  let longest = 0;
  for (const value of values) longest = Math.max(longest, bitLength(value < 0n ? -value : value));
  const surplus = BigInt(Math.max(0, longest - 62));
  return values.map((value) => Number(value >> surplus));
}
function lag1(values, sum, n, spread) {
  let products = 0n;
  let previous = null;
  for (const value of values) {
    const deviation = n * value - sum;
    if (previous !== null) products += previous * deviation;
    previous = deviation;
  }
  return toNumber({ numerator: products, denominator: n * spread });
}
function inUnits(numerator, denominator, exponent) {
  return exponent >= 0 ? { numerator: numerator * powerOfTen(exponent), denominator } : { numerator, denominator: denominator * powerOfTen(-exponent) };
}

// packages/metrology/src/kinds/bias-indices.ts
var none = {
  cg: null,
  cgk: null,
  cgLowerBound: null,
  cgkLowerBound: null,
  cgUpperBound: null,
  cgkUpperBound: null
};
function capabilityIndices({ share, sigmas, width }, confidence, bias2, standardDeviation, n) {
  if (!width || standardDeviation === null) return none;
  const allowance2 = multiply(rational(share), width);
  const room = subtract(divide(allowance2, rational(2)), absolute(rational(bias2)));
  const spread = multiply(rational(sigmas), rational(standardDeviation));
  const df = n - 1;
  const alpha = complement(confidence);
  const cg = toNumber(divide(allowance2, spread));
  const boundOfCg = (p) => cg * Math.sqrt(chiSquareQuantile(p, df) / df);
  const observed = Math.sqrt(n) * (toNumber(room) / standardDeviation);
  const boundOfCgk = (p) => Number.isFinite(observed) ? noncentralityAt(observed, df, p) / Math.sqrt(n) / (sigmas / 2) : null;
  return {
    cg,
    cgk: toNumber(divide(multiply(rational(2), room), spread)),
    cgLowerBound: boundOfCg(alpha),
    cgkLowerBound: boundOfCgk(confidence),
    cgUpperBound: boundOfCg(confidence),
    cgkUpperBound: boundOfCgk(alpha)
  };
}

// packages/metrology/src/kinds/bias.ts
function readBias(reader) {
  const common2 = readCommon(reader);
  const readings = reader.numbers("readings", 1);
  const index2 = reader.optionalObject("index");
  return {
    ...common2,
    readings,
    reference: readReference(reader),
    index: {
      share: index2?.optionalNumber("share", { above: 0 }) ?? 0.2,
      sigmas: index2?.optionalNumber("sigmas", { above: 0 }) ?? 6,
      ...given("width", index2?.optionalNumber("width", { above: 0 }))
    }
  };
}
function readReference(reader) {
  const source = reader.object("reference");
  return {
    value: source.number("value"),
    ...given("standardUncertainty", source.optionalNumber("standardUncertainty", { least: 0 }))
  };
}
function bias(input) {
  const { readings, reference, confidence, coverageFactor, margin, resolution } = input;
  const of = moments(readings);
  const { n, standardDeviation } = of;
  const degreesOfFreedom = n - 1;
  const alpha = complement(confidence);
  const estimate = toNumber(subtract(of.mean, rational(reference.value)));
  const varies = standardDeviation !== null && standardDeviation !== 0;
  const spread = varies && Number.isFinite(estimate) ? standardDeviation : null;
  const standardError = standardDeviation === null ? null : standardDeviation / Math.sqrt(n);
  const t = spread !== null && standardError ? estimate / standardError : null;
  const critical = n > 1 ? twoSidedCritical(alpha, degreesOfFreedom) : null;
  const halfWidth = critical !== null && standardError !== null ? critical * standardError : null;
  const width = input.index.width === void 0 ? toleranceWidth(input) : rational(input.index.width);
  const { share, sigmas } = input.index;
  const index2 = capabilityIndices({ share, sigmas, width }, confidence, estimate, spread, n);
  const uncertain = withUncertainty(input, of.variance, estimate, n);
  return {
    kind: "bias",
    n,
    mean: toNumber(of.mean),
    reference: { value: reference.value, standardUncertainty: reference.standardUncertainty ?? null },
    bias: estimate,
    standardDeviation,
    standardError,
    degreesOfFreedom,
    confidence,
    t,
    pValue: t === null ? null : tTwoSided(t, degreesOfFreedom),
    interval: halfWidth === null ? null : intervalAround(estimate, halfWidth),
    zeroTest: {
      alpha,
      criticalValue: critical,
      allowedBias: halfWidth,
      accepts: t === null || halfWidth === null ? null : Math.abs(estimate) <= halfWidth
    },
    equivalence: equivalence(estimate, spread, standardError, n, margin, alpha),
    intervalInside: {
      accepts: spread === null || halfWidth === null || margin === void 0 ? null : positionAgainstMargin(estimate, halfWidth, margin) === "inside"
    },
    index: { share, sigmas, width: width && toNumber(width) },
    ...index2,
    shareOfTolerance: shareOfTolerance(estimate, input),
    shareOfProcess: shareOfProcess(estimate, input),
    resolutionUsed: uncertain.resolutionUsed,
    withUncertainty: uncertain,
    minimum: of.minimum,
    maximum: of.maximum,
    lag1Autocorrelation: of.lag1Autocorrelation,
    warnings: [
      ...inputWarnings(input),
      ...!varies ? [noSpread(n)] : dataChecks(readings, of, resolution),
      ...referenceWarnings(reference.standardUncertainty, coverageFactor, margin)
    ]
  };
}
function equivalence(estimate, spread, standardError, n, margin, alpha) {
  const df = n - 1;
  const criticalValue = n > 1 && alpha <= 0.5 ? oneSidedCritical(alpha, df) : null;
  const halfWidth = criticalValue !== null && standardError !== null ? criticalValue * standardError : null;
  const interval = halfWidth === null ? null : intervalAround(estimate, halfWidth);
  const result = { alpha, margin: margin ?? null, criticalValue, interval };
  if (margin === void 0 || spread === null || !standardError) {
    return { ...result, pLower: null, pUpper: null, pValue: null, accepts: null };
  }
  const above = toNumber(subtract(rational(estimate), rational(-margin)));
  const below2 = toNumber(subtract(rational(estimate), rational(margin)));
  const pLower = tTails(above / standardError, df).upper;
  const pUpper = tTails(below2 / standardError, df).lower;
  const accepts = halfWidth === null ? null : positionAgainstMargin(estimate, halfWidth, margin) === "inside";
  return { ...result, pLower, pUpper, pValue: Math.max(pLower, pUpper), accepts };
}
function withUncertainty({ reference, coverageFactor, margin, resolution }, variance, estimate, n) {
  if (variance === null) {
    return {
      repeatability: null,
      resolutionUsed: false,
      coverageFactor,
      standardUncertainty: null,
      expandedUncertainty: null,
      insideMargin: null
    };
  }
  const step = rational(resolution ?? 0);
  const ofResolution = divide(multiply(step, step), rational(12));
  const resolutionUsed = compare(ofResolution, variance) > 0;
  const repeatability = resolutionUsed ? ofResolution : variance;
  const u = rational(reference.standardUncertainty ?? 0);
  const total = add(divide(repeatability, rational(n)), multiply(u, u));
  const standardUncertainty = squareRoot(total);
  const insideMargin = () => {
    if (margin === void 0 || repeatability.numerator === 0n || !Number.isFinite(estimate)) return null;
    const room = divide(subtract(rational(margin), absolute(rational(estimate))), rational(coverageFactor));
    return room.numerator >= 0n && compare(total, multiply(room, room)) <= 0;
  };
  return {
    repeatability: squareRoot(repeatability),
    resolutionUsed,
    coverageFactor,
    standardUncertainty,
    expandedUncertainty: coverageFactor * standardUncertainty,
    insideMargin: insideMargin()
  };
}
function toleranceWidth({ tolerance }) {
  const { lower, upper } = tolerance ?? {};
  return lower === void 0 || upper === void 0 ? null : subtract(rational(upper), rational(lower));
}
function shareOfTolerance(estimate, input) {
  const width = toleranceWidth(input);
  return width && Number.isFinite(estimate) ? toNumber(divide(absolute(rational(estimate)), width)) : null;
}
function shareOfProcess(estimate, input) {
  if (input.processStandardDeviation === void 0 || !Number.isFinite(estimate)) return null;
  const variation = multiply(rational(input.sigmas), rational(input.processStandardDeviation));
  return toNumber(divide(absolute(rational(estimate)), variation));
}
function inputWarnings({ margin, tolerance, confidence }) {
  const warnings = [];
  if (margin === void 0) {
    warnings.push({ code: "no-margin", message: "No margin is given: equivalence is not decided." });
  }
  if (!tolerance) {
    warnings.push({
      code: "no-tolerance",
      message: "No tolerance is given: indices and the share of tolerance are not defined."
    });
  } else if (tolerance.lower === void 0 || tolerance.upper === void 0) {
    warnings.push({
      code: "one-sided-tolerance",
      message: "The tolerance has one limit and so no width: indices and the share of tolerance are not defined."
    });
  }
  if (confidence < 0.5) {
    warnings.push({
      code: "confidence-too-low",
      message: "At a confidence below one half the interval of the equivalence test does not exist."
    });
  }
  return warnings;
}
function noSpread(n) {
  return n === 1 ? { code: "one-reading", message: "One reading has no spread: nothing can be decided from it." } : {
    code: "below-resolution",
    message: "The readings do not vary: their spread is below the resolution, and nothing can be decided."
  };
}
function referenceWarnings(u, factor, margin) {
  if (u === void 0 || margin === void 0 || !eatsMargin(u, factor, margin)) return [];
  return [
    {
      code: "reference-uncertainty-too-large",
      message: "The expanded uncertainty of the reference value uses up the whole margin.",
      figures: { expandedUncertainty: factor * u, margin }
    }
  ];
}

// packages/metrology/src/types/clauses.ts
var subjects = [
  "design",
  "resolution",
  "calibration",
  "bias",
  "linearity",
  "stability",
  "repeatability",
  "attribute",
  "uncertainty"
];

// packages/metrology/src/units/index.ts
var unit = (symbol, quantity, numerator, denominator = 1) => ({
  symbol,
  quantity,
  size: [numerator, denominator]
});
var units = [
  unit("mm", "length", 1),
  unit("µm", "length", 1, 1e3),
  unit("nm", "length", 1, 1e6),
  unit("cm", "length", 10),
  unit("m", "length", 1e3),
  unit("in", "length", 254, 10),
  unit("°", "angle", 1),
  unit("′", "angle", 1, 60),
  unit("″", "angle", 1, 3600),
  unit("g", "mass", 1),
  unit("mg", "mass", 1, 1e3),
  unit("kg", "mass", 1e3),
  unit("N", "force", 1),
  unit("mN", "force", 1, 1e3),
  unit("kN", "force", 1e3),
  unit("N·m", "torque", 1),
  unit("N·cm", "torque", 1, 100),
  unit("N·mm", "torque", 1, 1e3),
  unit("Pa", "pressure", 1),
  unit("kPa", "pressure", 1e3),
  unit("MPa", "pressure", 1e6),
  unit("mbar", "pressure", 100),
  unit("bar", "pressure", 1e5),
  unit("ml/min", "flow", 1),
  unit("l/min", "flow", 1e3),
  unit("s", "time", 1),
  unit("ms", "time", 1, 1e3),
  unit("min", "time", 60),
  unit("°C", "temperature", 1),
  unit("V", "voltage", 1),
  unit("mV", "voltage", 1, 1e3),
  unit("A", "current", 1),
  unit("mA", "current", 1, 1e3),
  unit("Ω", "resistance", 1),
  unit("mΩ", "resistance", 1, 1e3),
  unit("kΩ", "resistance", 1e3),
  unit("HRC", "hardness-rockwell-c", 1),
  unit("HV", "hardness-vickers", 1),
  unit("%", "fraction", 1),
  unit("‰", "fraction", 1, 10),
  unit("1", "count", 1)
];
var bySymbol = new Map(units.map((each) => [each.symbol, each]));
function findUnit(symbol) {
  return bySymbol.get(symbol);
}
function convertExactly(value, from, to) {
  if (from === to) return value;
  const [source, target] = [findUnit(from), findUnit(to)];
  if (!source || !target || source.quantity !== target.quantity) return null;
  return divide(multiply(value, sizeOf(source)), sizeOf(target));
}
var sizeOf = ({ size: [numerator, denominator] }) => ({
  numerator: BigInt(numerator),
  denominator: BigInt(denominator)
});

// packages/metrology/src/clauses/baselines.ts
var sigmasOfProcess = 6;
function baselineWidth(base, of, agreed) {
  if (base === "process") return processWidth(of);
  const { lower, upper } = of.tolerance ?? {};
  if (lower !== void 0 && upper !== void 0) return subtract(rational(upper), rational(lower));
  return agreed && isOneSided(of) ? agreedWidth(agreed, of) : null;
}
function processWidth({ processStandardDeviation: sigma }) {
  return sigma === void 0 ? null : multiply(rational(sigmasOfProcess), rational(sigma));
}
var isOneSided = ({ tolerance }) => tolerance !== void 0 && tolerance.lower === void 0 !== (tolerance.upper === void 0);
function agreedWidth(agreed, of) {
  const width = formed(agreed, of);
  return width && width.numerator > 0n ? width : null;
}
function formed(agreed, of) {
  if (agreed.kind === "process") return processWidth(of);
  if (agreed.kind === "absolute") return convertExactly(rational(agreed.value), agreed.unit, of.unit);
  const { lower, upper } = of.tolerance ?? {};
  const bound = rational(agreed.value);
  if (upper !== void 0) return subtract(rational(upper), bound);
  return lower === void 0 ? null : subtract(bound, rational(lower));
}
function missingBaseline(base) {
  return base === "process" ? "no-process-spread" : "no-tolerance-width";
}
function baselineProblems(base, of, paths, agreed) {
  if (agreed?.kind === "absolute" && !findUnit(agreed.unit))
    return [unitProblem(agreed.unit, of, `${paths.agreed}.unit`)];
  if (baselineWidth(base, of, agreed)) return [];
  if (base === "tolerance" && agreed && isOneSided(of)) return [agreedProblem(agreed, of, paths.agreed)];
  return [
    {
      code: missingBaseline(base),
      path: paths.base,
      message: base === "process" ? "No standard deviation of the process is known; name a share of tolerance or an absolute value instead." : "There is no two-sided tolerance to take a share of; agree what stands in for its width, or name a share of process variation or an absolute value instead."
    }
  ];
}
function agreedProblem(agreed, of, path) {
  if (agreed.kind === "process") {
    return {
      code: "no-process-spread",
      path: `${path}.kind`,
      message: "No standard deviation of the process is known to stand in for the width of the tolerance."
    };
  }
  if (agreed.kind === "absolute") return unitProblem(agreed.unit, of, `${path}.unit`);
  const side = of.tolerance?.upper === void 0 ? "above the lower limit" : "below the upper limit";
  return {
    code: "bound-beyond-limit",
    path: `${path}.value`,
    message: `The natural bound must lie ${side} of the characteristic.`
  };
}
function marginInUnit(margin, of) {
  const exact = exactMargin(margin, of);
  const value = exact && toNumber(exact);
  return value !== null && value > 0 && Number.isFinite(value) ? value : null;
}
var agreedFor = (margin) => margin.base === "tolerance" ? margin.baseline : void 0;
function exactMargin(margin, of) {
  if (margin.base === "absolute") return convertExactly(rational(margin.value), margin.unit, of.unit);
  const width = baselineWidth(margin.base, of, agreedFor(margin));
  return width && multiply(rational(margin.share), width);
}
function marginProblems(margin, of, path) {
  if (margin.base !== "absolute") {
    const paths = { base: `${path}.base`, agreed: `${path}.baseline` };
    const problems = baselineProblems(margin.base, of, paths, agreedFor(margin));
    if (problems.length > 0) return problems;
  }
  const exact = exactMargin(margin, of);
  if (exact)
    return sizeProblems(toNumber(exact), of, `${path}.${margin.base === "absolute" ? "value" : "share"}`);
  return margin.base === "absolute" ? [unitProblem(margin.unit, of, `${path}.unit`)] : [];
}
function unitProblem(unit2, of, path) {
  return findUnit(unit2) ? {
    code: "unit-of-another-quantity",
    path,
    message: `A value in ${unit2} cannot limit a characteristic in ${of.unit}.`
  } : { code: "unit-unknown", path, message: `The unit ${unit2} is not in the list of units.` };
}
function sizeProblems(value, of, path) {
  if (value > 0 && Number.isFinite(value)) return [];
  const code = value > 0 ? "too-large" : "too-small";
  return [
    {
      code,
      path,
      message: `The margin is ${code === "too-large" ? "too large" : "too small"} to be written in ${of.unit}.`
    }
  ];
}

// packages/metrology/src/input/bounds.ts
var [smallest, largest] = [1e-100, 1e100];
var positiveSize = { above: 0, least: smallest, most: largest };
var notNegativeSize = { least: 0, most: largest };
var anySize = { least: -largest, most: largest };

// packages/metrology/src/rules/band.ts
var acceptedHalfWidth = (band2, s) => band2.largestSpread !== void 0 && s > band2.largestSpread ? -1 : band2.halfWidth(s);
function linearBand(offset, slope) {
  return {
    halfWidth: (s) => offset + slope * s,
    spreadAt: (h) => {
      const s = (h - offset) / slope;
      return s >= 0 && Number.isFinite(s) ? s : null;
    },
    bends: []
  };
}
function uncertaintyBand(offset, factor, n, u) {
  const rootN = Math.sqrt(n);
  return {
    halfWidth: (s) => offset + factor * rootSumOfSquares(s / rootN, u),
    spreadAt: (h) => {
      const total = (h - offset) / factor;
      return total >= u ? rootN * Math.sqrt((total - u) * (total + u)) : null;
    },
    // √(s²/n + u²) turns from u to s/√n around s = u·√n.
    bends: u > 0 ? [0.25, 1, 4, 16].map((times) => times * u * rootN) : []
  };
}
function rootSumOfSquares(a, b) {
  const large = Math.max(a, b);
  if (large === 0 || large === Infinity) return large;
  const ratio = Math.min(a, b) / large;
  return large * Math.sqrt(1 + ratio * ratio);
}

// packages/metrology/src/rules/capability-index.ts
var allowance = ({ share, toleranceWidth: toleranceWidth2 }) => share * toleranceWidth2 / 2;
var halfSpread = ({ least, sigmas }) => least * sigmas / 2;
var spreadAtLeast = (rule, bias2) => Math.min(
  (allowance(rule) - Math.abs(bias2)) / halfSpread(rule),
  rule.leastCg === void 0 ? Infinity : 2 * allowance(rule) / (rule.leastCg * rule.sigmas)
);
var marginOfSafety = 0.9;
function band(rule, n, p) {
  const half = halfSpread(rule);
  const factor = p === null ? half : noncentralTQuantile(p, n - 1, Math.sqrt(n) * half) / Math.sqrt(n);
  const ofCg = rule.leastCg === void 0 ? null : 2 * allowance(rule) / (rule.leastCg * rule.sigmas);
  const shrunk = p === null ? 1 : Math.sqrt(chiSquareQuantile(complement(p), n - 1) / (n - 1));
  return {
    ...linearBand(allowance(rule), -factor),
    ...ofCg !== null && { largestSpread: ofCg * shrunk }
  };
}
var index = {
  type: "index",
  read: (reader) => ({
    type: "index",
    share: reader.number("share", positiveSize),
    sigmas: reader.number("sigmas", positiveSize),
    least: reader.number("least", positiveSize),
    toleranceWidth: reader.number("toleranceWidth", positiveSize),
    ...given("leastCg", reader.optionalNumber("leastCg", positiveSize)),
    ...given("alpha", reader.optionalNumber("alpha", { above: 0, most: 0.5 }))
  }),
  accepts: (rule, n) => band(rule, n, rule.alpha === void 0 ? null : complement(rule.alpha)),
  refusesOutside: (rule, n) => rule.alpha === void 0 ? null : band(rule, n, rule.alpha),
  referenceUncertainty: () => 0,
  margin: allowance,
  largestSpread: (rule, bias2) => rule.alpha === void 0 ? spreadAtLeast(rule, bias2) : marginOfSafety * spreadAtLeast(rule, bias2),
  stricter: (rule) => rule.alpha === void 0 ? null : { ...rule, alpha: rule.alpha / 2 },
  powerOf: "meets"
};

// packages/metrology/src/rules/point.ts
var point = {
  type: "point",
  read: (reader) => ({ type: "point", margin: reader.number("margin", positiveSize) }),
  accepts: ({ margin }) => linearBand(margin, 0),
  refusesOutside: () => null,
  referenceUncertainty: () => 0,
  margin: ({ margin }) => margin,
  largestSpread: ({ margin }) => margin,
  stricter: () => null,
  powerOf: "meets"
};

// packages/metrology/src/rules/interval-rules.ts
var inside = (margin, factor) => linearBand(margin, -factor);
var outside2 = (margin, factor) => linearBand(margin, factor);
var readInterval = (reader, bounds) => ({
  alpha: reader.number("alpha", { above: 0, ...bounds }),
  margin: reader.number("margin", positiveSize)
});
var equivalenceFactor = (alpha, n) => oneSidedCritical(alpha, n - 1) / Math.sqrt(n);
var intervalFactor = (alpha, n) => twoSidedCritical(alpha, n - 1) / Math.sqrt(n);
var common = {
  referenceUncertainty: () => 0,
  margin: ({ margin }) => margin,
  // A gauge whose spread exceeds the margin itself is none these rules are meant to accept.
  largestSpread: ({ margin }) => margin,
  powerOf: "meets"
};
var equivalence2 = {
  ...common,
  type: "equivalence",
  read: (reader) => ({ type: "equivalence", ...readInterval(reader, { most: 0.5 }) }),
  accepts: ({ alpha, margin }, n) => inside(margin, equivalenceFactor(alpha, n)),
  refusesOutside: ({ alpha, margin }, n) => outside2(margin, equivalenceFactor(alpha, n)),
  stricter: (rule) => ({ ...rule, alpha: rule.alpha / 2 })
};
var intervalInside = {
  ...common,
  type: "interval-inside",
  read: (reader) => ({ type: "interval-inside", ...readInterval(reader, { below: 1 }) }),
  accepts: ({ alpha, margin }, n) => inside(margin, intervalFactor(alpha, n)),
  refusesOutside: ({ alpha, margin }, n) => outside2(margin, intervalFactor(alpha, n)),
  stricter: (rule) => ({ ...rule, alpha: rule.alpha / 2 })
};

// packages/metrology/src/rules/with-uncertainty.ts
var withUncertainty2 = {
  type: "with-uncertainty",
  read: (reader) => ({
    type: "with-uncertainty",
    margin: reader.number("margin", positiveSize),
    referenceStandardUncertainty: reader.number("referenceStandardUncertainty", notNegativeSize),
    coverageFactor: reader.optionalNumber("coverageFactor", positiveSize) ?? 2
  }),
  accepts: (rule, n) => uncertaintyBand(rule.margin, -rule.coverageFactor, n, rule.referenceStandardUncertainty),
  refusesOutside: (rule, n) => uncertaintyBand(rule.margin, rule.coverageFactor, n, rule.referenceStandardUncertainty),
  referenceUncertainty: (rule) => rule.referenceStandardUncertainty,
  margin: ({ margin }) => margin,
  largestSpread: ({ margin }) => margin,
  stricter: () => null,
  powerOf: "meets"
};

// packages/metrology/src/rules/zero-test.ts
var zeroTest = {
  type: "zero-test",
  read: (reader) => ({ type: "zero-test", alpha: reader.number("alpha", { above: 0, below: 1 }) }),
  accepts: ({ alpha }, n) => linearBand(0, twoSidedCritical(alpha, n - 1) / Math.sqrt(n)),
  refusesOutside: () => null,
  referenceUncertainty: () => 0,
  margin: () => null,
  largestSpread: () => null,
  stricter: (rule) => ({ ...rule, alpha: rule.alpha / 2 }),
  powerOf: "fallsShort"
};

// packages/metrology/src/rules/index.ts
var descriptors = {
  "zero-test": zeroTest,
  equivalence: equivalence2,
  "interval-inside": intervalInside,
  point,
  index,
  "with-uncertainty": withUncertainty2
};
var ruleTypes = Object.keys(descriptors);
function ruleDescriptor(rule) {
  return descriptors[rule.type];
}
function readRule(reader) {
  const source = reader.object("rule");
  const read = descriptors[source.choice("type", ruleTypes)].read;
  return read(source);
}

// packages/metrology/src/rules/spread-nodes.ts
var import_math_base_special_exp8 = __toESM(require_lib58(), 1);
var panelCount = 8;
function spreadSupport(df) {
  const peak = Math.sqrt((df - 1) / df);
  const floor = (peak > 0 ? logChiShape(peak, df) : 0) - 34;
  const outside3 = (v) => v <= 0 || logChiShape(v, df) < floor;
  const lower = bisect(peak, 0, outside3);
  const upper = bisect(peak, peak + 12 / Math.sqrt(df), outside3);
  return { lower, upper, panel: (upper - lower) / panelCount };
}
function bisect(inner, outer, outside3) {
  let [near, far] = [inner, outer];
  for (let i = 0; i < 10; i++) {
    const middle = 0.5 * (near + far);
    if (outside3(middle)) far = middle;
    else near = middle;
  }
  return far;
}
function spreadNodes(df, support, breakPoints) {
  const { lower, upper, panel } = support;
  const points = [lower, upper];
  for (let i = 1; i < panelCount; i++) points.push(lower + i * panel);
  for (const point2 of breakPoints) if (point2 > lower && point2 < upper) points.push(point2);
  points.sort((a, b) => a - b);
  const constant = chiConstant(df);
  const result = [];
  for (let i = 1; i < points.length; i++) {
    const from = points[i - 1];
    const to = points[i];
    const center = 0.5 * (from + to);
    const half = 0.5 * (to - from);
    if (half <= 0) continue;
    for (const [node, weight] of nodes) {
      for (const v of [center - half * node, center + half * node]) {
        result.push({ v, weight: half * weight * constant * (0, import_math_base_special_exp8.default)(logChiShape(v, df)) });
      }
    }
  }
  return result;
}

// packages/metrology/src/rules/chances.ts
function chancesOf(rule, n) {
  const descriptor = ruleDescriptor(rule);
  const accepted = chanceInside(descriptor.accepts(rule, n), n);
  const refused = descriptor.refusesOutside(rule, n);
  const notRefused = refused ? chanceInside(refused, n) : null;
  const reference = descriptor.referenceUncertainty(rule);
  return (truth) => {
    const at = located(truth, n, reference);
    const meets = accepted(at);
    const fallsShort = notRefused ? Math.max(0, 1 - notRefused(at)) : 1 - meets;
    return { meets, fallsShort, notShown: notRefused ? Math.max(0, 1 - meets - fallsShort) : 0 };
  };
}
function chanceToMeet(rule, n) {
  const descriptor = ruleDescriptor(rule);
  const accepted = chanceInside(descriptor.accepts(rule, n), n);
  const reference = descriptor.referenceUncertainty(rule);
  return (truth) => accepted(located(truth, n, reference));
}
var located = ({ bias: bias2, standardDeviation }, n, reference) => ({
  bias: Math.abs(bias2),
  standardDeviation,
  spreadOfMean: rootSumOfSquares(standardDeviation / Math.sqrt(n), reference)
});
var reach = 9;
function chanceInside(band2, n) {
  const df = n - 1;
  const support = spreadSupport(df);
  let plain = null;
  return (at) => {
    const { bias: bias2, standardDeviation, spreadOfMean } = at;
    const sharp = sharpPoints(band2, at, support);
    let nodes2;
    if (sharp.length > 0) {
      nodes2 = spreadNodes(df, support, [...edges(band2, standardDeviation), ...sharp]);
    } else {
      if (plain?.standardDeviation !== standardDeviation) {
        plain = { standardDeviation, nodes: spreadNodes(df, support, edges(band2, standardDeviation)) };
      }
      nodes2 = plain.nodes;
    }
    let sum = 0;
    for (const { v, weight } of nodes2) {
      const h = acceptedHalfWidth(band2, standardDeviation * v);
      if (h < 0) continue;
      const above = (h - bias2) / spreadOfMean;
      const below2 = (h + bias2) / spreadOfMean;
      if (above < -reach) continue;
      sum += weight * ((above > reach ? 1 : normalCdf(above)) - (below2 > reach ? 0 : normalCdf(-below2)));
    }
    return Math.min(1, Math.max(0, sum));
  };
}
function edges(band2, standardDeviation) {
  const closed = [band2.spreadAt(0), band2.largestSpread].filter((s) => s !== null && s !== void 0);
  return [...closed, ...band2.bends].map((s) => s / standardDeviation);
}
function sharpPoints(band2, at, support) {
  const { bias: bias2, standardDeviation, spreadOfMean } = at;
  const slope = Math.abs(
    band2.halfWidth(standardDeviation * support.upper) - band2.halfWidth(standardDeviation * support.lower)
  ) / ((support.upper - support.lower) * spreadOfMean);
  if (!(slope * support.panel > 6)) return [];
  const points = [];
  for (const side of [bias2, -bias2]) {
    for (let z = -reach; z <= reach; z += 4.5) {
      const s = band2.spreadAt(side + z * spreadOfMean);
      if (s !== null) points.push(s / standardDeviation);
    }
  }
  return points.filter((v) => v > support.lower && v < support.upper);
}

// packages/metrology/src/kinds/operating-characteristic.ts
function operatingCharacteristic(rule, n, truth) {
  const chances = truth.map(chancesOf(rule, n));
  return {
    kind: "operatingCharacteristic",
    meets: chances.map(({ meets }) => meets),
    fallsShort: chances.map(({ fallsShort }) => fallsShort),
    notShown: chances.map(({ notShown: notShown2 }) => notShown2),
    warnings: []
  };
}
function readOperatingCharacteristic(reader) {
  const rule = readRule(reader);
  const n = readDesign(reader);
  return operatingCharacteristic(rule, n, reader.objects("truth", 1).map(readTruth));
}
function readDesign(reader) {
  return reader.object("design").integer("n", { least: 2, most: 1e6 });
}
function readTruth(reader) {
  return {
    bias: reader.number("bias", anySize),
    standardDeviation: reader.number("standardDeviation", positiveSize)
  };
}

// packages/metrology/src/kinds/sample-size.ts
var mostReadings = 1e5;
function sampleSize(rule, truth, power) {
  const { powerOf } = ruleDescriptor(rule);
  const chance = (n) => powerOf === "meets" ? chanceToMeet(rule, n)(truth) : chancesOf(rule, n)(truth)[powerOf];
  let held = null;
  for (const n of searchedDownwards()) {
    const here = chance(n);
    if (here >= power) held = { n, power: here };
    else return held && refine(chance, power, n, held);
  }
  return held;
}
function refine(chance, power, tooFew, enough) {
  let low = tooFew;
  let held = enough;
  while (held.n - low > 1) {
    const middle = Math.floor((low + held.n) / 2);
    const here = chance(middle);
    if (here >= power) held = { n: middle, power: here };
    else low = middle;
  }
  return held;
}
function* searchedDownwards() {
  let n = mostReadings;
  while (n > 32) {
    yield n;
    n = Math.max(32, Math.floor(n / 1.08));
  }
  for (; n >= 2; n--) yield n;
}
function readSampleSize(reader) {
  const rule = readRule(reader);
  const truth = readTruth(reader.object("truth"));
  const power = reader.number("power", { above: 0, below: 1 });
  const found = sampleSize(rule, truth, power);
  if (!found) {
    throw new InvalidInput(
      "no-sample-size",
      `No number of readings up to ${mostReadings} gives this chance at this truth; assume a smaller bias or spread, or ask for less.`,
      "power"
    );
  }
  return { kind: "sampleSize", ...found, warnings: [] };
}

// packages/metrology/src/clauses/bias-facts.ts
function biasFacts(study) {
  if (!study) return { code: "no-study" };
  const { n, bias: bias2, standardDeviation, reference } = study;
  if (n < 2) return { code: "one-reading" };
  if (standardDeviation === 0) return { code: "zero-spread" };
  if (standardDeviation === null || bias2 === null || !Number.isFinite(bias2))
    return { code: "not-representable" };
  return {
    n,
    bias: bias2,
    standardDeviation,
    standardError: standardDeviation / Math.sqrt(n),
    referenceStandardUncertainty: reference.standardUncertainty
  };
}
function factsWithin(margin, { study, coverageFactor }) {
  const of = biasFacts(study);
  if (isReason(of)) return of;
  const u = of.referenceStandardUncertainty;
  return u !== null && eatsMargin(u, coverageFactor, margin) ? { code: "reference-uncertainty-too-large", expandedUncertainty: coverageFactor * u, margin } : of;
}
var isReason = (value) => "code" in value;
function notShown({ study }, limits, reason) {
  return {
    verdict: "not-shown",
    figure: study?.bias ?? null,
    interval: null,
    limits,
    quantity: "value",
    reason
  };
}
function standardUncertaintyOf(of, u, facts) {
  const evaluated = facts.study?.withUncertainty?.standardUncertainty;
  if (evaluated != null) return evaluated;
  const square = (value) => multiply(rational(value), rational(value));
  const step = divide(square(facts.characteristic.resolution ?? 0), rational(12));
  const spread = square(of.standardDeviation);
  const larger = step.numerator * spread.denominator > spread.numerator * step.denominator ? step : spread;
  return squareRoot(add(divide(larger, rational(of.n)), square(u)));
}
function readingsFor(rule, truth, power) {
  const found = rule && sampleSize(rule, truth, power);
  return found ? { readings: found.n, chance: found.power, reason: "size-found" } : { readings: null, chance: null, reason: "no-size-suffices" };
}

// packages/metrology/src/clauses/bias-index.ts
var biasIndex = {
  type: "bias-index",
  subject: "bias",
  measure: "index",
  basis: "estimate",
  basisOf: ({ parameters }) => parameters.basis,
  studyKind: "bias",
  fields: [
    { name: "share", kind: "share", required: true, default: 0.2 },
    { name: "base", kind: "choice", required: true, choices: ["tolerance", "process"], default: "tolerance" },
    { name: "baseline", kind: "baseline", required: false },
    { name: "sigmas", kind: "number", required: true, minimum: 1, maximum: 12, default: 6 },
    {
      name: "leastCg",
      kind: "nullable-number",
      required: false,
      exclusiveMinimum: 0,
      maximum: 100,
      default: 1.33
    },
    {
      name: "leastCgk",
      kind: "number",
      required: true,
      exclusiveMinimum: 0,
      maximum: 100,
      default: 1.33
    },
    { name: "basis", kind: "choice", required: true, choices: ["estimate", "bound"], default: "bound" },
    { name: "confidence", kind: "confidence", required: true, default: 0.95 }
  ],
  check: ({ parameters }, characteristic) => baselineProblems(
    parameters.base,
    characteristic,
    { base: "parameters.base", agreed: "parameters.baseline" },
    parameters.baseline
  ),
  rule: ({ parameters }, characteristic) => indexRule(parameters, characteristic),
  options: ({ parameters }, characteristic) => {
    const { share, sigmas, confidence } = parameters;
    const width = widthOf(parameters, characteristic);
    return { confidence, index: { share, sigmas, ...width !== null && { width } } };
  },
  judge: ({ parameters }, facts) => {
    const { share, sigmas, confidence, basis, base, leastCg, leastCgk } = parameters;
    const limits = { lower: leastCgk, upper: null };
    const asIndex = (judgement) => ({ ...judgement, figure: null, quantity: "ratio" });
    const inUnit = widthOf(parameters, facts.characteristic);
    if (inUnit === null) return asIndex(notShown(facts, limits, { code: missingBaseline(base) }));
    const width = rational(inUnit);
    const most = toNumber(divide(multiply(rational(share), width), rational(2)));
    const of = factsWithin(most, facts);
    if (isReason(of)) return asIndex(notShown(facts, limits, of));
    const found = capabilityIndices({ share, sigmas, width }, confidence, of.bias, of.standardDeviation, of.n);
    const parts = partsOf(found, leastCg, leastCgk);
    const judged = parts.map((part2) => ({ part: part2, ...basis === "bound" ? onBound(part2) : onEstimate(part2) }));
    const decisive = judged.reduce(
      (worst, each) => severity[each.verdict] > severity[worst.verdict] ? each : worst
    );
    const { part, verdict, code } = decisive;
    return {
      verdict,
      figure: part.figure,
      interval: basis === "bound" ? { lower: part.lower, upper: part.upper } : null,
      limits: { lower: part.least, upper: null },
      quantity: "ratio",
      reason: { code, index: part.index, least: part.least, cg: found.cg, cgk: found.cgk }
    };
  },
  readingsNeeded: ({ parameters }, characteristic, truth, power) => readingsFor(indexRule(parameters, characteristic), truth, power)
};
var severity = {
  meets: 0,
  "meets-with-conditions": 1,
  "not-shown": 2,
  "falls-short": 3
};
function widthOf({ base, baseline }, of) {
  const exact = baselineWidth(base, of, baseline);
  const width = exact && toNumber(exact);
  return width !== null && width > 0 && Number.isFinite(width) ? width : null;
}
function indexRule(parameters, of) {
  const { share, sigmas, leastCg, leastCgk, basis, confidence } = parameters;
  const width = widthOf(parameters, of);
  if (width === null) return null;
  return {
    ...{ type: "index", share, sigmas, least: leastCgk, toleranceWidth: width },
    ...leastCg !== null && { leastCg },
    ...basis === "bound" && { alpha: complement(confidence) }
  };
}
function partsOf(found, leastCg, leastCgk) {
  const cgk = {
    index: "cgk",
    least: leastCgk,
    figure: found.cgk ?? NaN,
    lower: found.cgkLowerBound,
    upper: found.cgkUpperBound
  };
  if (leastCg === null) return [cgk];
  return [
    cgk,
    {
      index: "cg",
      least: leastCg,
      figure: found.cg ?? NaN,
      lower: found.cgLowerBound,
      upper: found.cgUpperBound
    }
  ];
}
var undefinedFigure = { verdict: "not-shown", code: "not-representable" };
function onEstimate({ figure, least }) {
  if (!Number.isFinite(figure)) return undefinedFigure;
  return figure >= least ? { verdict: "meets", code: "index-high-enough" } : { verdict: "falls-short", code: "index-too-low" };
}
function onBound({ figure, lower, upper, least }) {
  const figures = [figure, lower, upper];
  if (lower === null || upper === null || !figures.every(Number.isFinite)) return undefinedFigure;
  if (lower >= least) return { verdict: "meets", code: "index-bound-high-enough" };
  return upper < least ? { verdict: "falls-short", code: "index-bound-too-low" } : { verdict: "not-shown", code: "index-bound-open" };
}

// packages/metrology/src/clauses/bias-intervals.ts
var decided = {
  inside: { verdict: "meets", code: "interval-inside-margin" },
  outside: { verdict: "falls-short", code: "interval-outside-margin" },
  crosses: { verdict: "not-shown", code: "interval-crosses-margin" }
};
function intervalClause(type, rule, critical) {
  const ruleOf = (confidence, inUnit) => inUnit === null ? null : { type: rule, alpha: complement(confidence), margin: inUnit };
  const judge2 = ({ margin: agreed, confidence }, facts) => {
    const margin = marginInUnit(agreed, facts.characteristic);
    if (margin === null) return notShown(facts, null, { code: "margin-undefined" });
    const limits = { lower: -margin, upper: margin };
    const of = factsWithin(margin, facts);
    if (isReason(of)) return notShown(facts, limits, of);
    const halfWidth = critical(complement(confidence), of.n - 1) * of.standardError;
    const { verdict, code } = decided[positionAgainstMargin(of.bias, halfWidth, margin)];
    return {
      verdict,
      figure: of.bias,
      interval: intervalAround(of.bias, halfWidth),
      limits,
      quantity: "value",
      reason: { code, margin, halfWidth }
    };
  };
  return {
    type,
    subject: "bias",
    measure: "mean",
    basis: "bound",
    studyKind: "bias",
    fields: [
      { name: "margin", kind: "margin", required: true, default: { base: "tolerance", share: 0.05 } },
      { name: "confidence", kind: "confidence", required: true, default: 0.95 }
    ],
    check: ({ parameters }, characteristic) => marginProblems(parameters.margin, characteristic, "parameters.margin"),
    rule: ({ parameters }, characteristic) => ruleOf(parameters.confidence, marginInUnit(parameters.margin, characteristic)),
    options: ({ parameters }, characteristic) => {
      const margin = marginInUnit(parameters.margin, characteristic);
      return { confidence: parameters.confidence, ...margin === null ? {} : { margin } };
    },
    judge: ({ parameters }, facts) => judge2(parameters, facts),
    readingsNeeded: ({ parameters }, characteristic, truth, power) => readingsFor(
      ruleOf(parameters.confidence, marginInUnit(parameters.margin, characteristic)),
      truth,
      power
    )
  };
}
var biasEquivalence = intervalClause("bias-equivalence", "equivalence", oneSidedCritical);
var biasIntervalInside = intervalClause("bias-interval-inside", "interval-inside", twoSidedCritical);

// packages/metrology/src/clauses/bias-point.ts
var biasPoint = {
  type: "bias-point",
  subject: "bias",
  measure: "mean",
  basis: "estimate",
  studyKind: "bias",
  fields: [{ name: "margin", kind: "margin", required: true, default: { base: "tolerance", share: 0.05 } }],
  check: ({ parameters }, characteristic) => marginProblems(parameters.margin, characteristic, "parameters.margin"),
  rule: ({ parameters }, characteristic) => {
    const margin = marginInUnit(parameters.margin, characteristic);
    return margin === null ? null : { type: "point", margin };
  },
  options: ({ parameters }, characteristic) => {
    const margin = marginInUnit(parameters.margin, characteristic);
    return margin === null ? {} : { margin };
  },
  judge: ({ parameters }, facts) => {
    const margin = marginInUnit(parameters.margin, facts.characteristic);
    if (margin === null) return notShown(facts, null, { code: "margin-undefined" });
    const limits = { lower: -margin, upper: margin };
    const of = factsWithin(margin, facts);
    if (isReason(of)) return notShown(facts, limits, of);
    const within = compare(absolute(rational(of.bias)), rational(margin)) <= 0;
    return {
      verdict: within ? "meets" : "falls-short",
      figure: of.bias,
      interval: null,
      limits,
      quantity: "value",
      reason: { code: within ? "bias-within-margin" : "bias-beyond-margin", margin }
    };
  },
  readingsNeeded: ({ parameters }, characteristic, truth, power) => {
    const margin = marginInUnit(parameters.margin, characteristic);
    return readingsFor(margin === null ? null : { type: "point", margin }, truth, power);
  }
};

// packages/metrology/src/clauses/bias-with-uncertainty.ts
var biasWithUncertainty = {
  type: "bias-with-uncertainty",
  subject: "bias",
  measure: "with-uncertainty",
  basis: "bound",
  studyKind: "bias",
  fields: [
    { name: "margin", kind: "margin", required: true, default: { base: "tolerance", share: 0.1 } },
    { name: "coverageFactor", kind: "number", required: true, minimum: 1, maximum: 10, default: 2 }
  ],
  check: ({ parameters }, characteristic) => marginProblems(parameters.margin, characteristic, "parameters.margin"),
  rule: ({ parameters }, characteristic, assumed) => uncertaintyRule(parameters, characteristic, assumed),
  options: ({ parameters }, characteristic) => {
    const margin = marginInUnit(parameters.margin, characteristic);
    return { coverageFactor: parameters.coverageFactor, ...margin === null ? {} : { margin } };
  },
  judge: ({ parameters }, facts) => {
    const { coverageFactor } = parameters;
    const margin = marginInUnit(parameters.margin, facts.characteristic);
    if (margin === null) return notShown(facts, null, { code: "margin-undefined" });
    const limits = { lower: -margin, upper: margin };
    const of = biasFacts(facts.study);
    if (isReason(of)) return notShown(facts, limits, of);
    const u = of.referenceStandardUncertainty;
    if (u === null) return notShown(facts, limits, { code: "reference-uncertainty-unknown" });
    if (eatsMargin(u, coverageFactor, margin)) {
      const expandedUncertainty2 = coverageFactor * u;
      return notShown(facts, limits, { code: "reference-uncertainty-too-large", expandedUncertainty: expandedUncertainty2, margin });
    }
    const standardUncertainty = standardUncertaintyOf(of, u, facts);
    const room = toNumber(
      divide(subtract(rational(margin), absolute(rational(of.bias))), rational(coverageFactor))
    );
    const { verdict, code } = against(standardUncertainty, room);
    const expandedUncertainty = coverageFactor * standardUncertainty;
    return {
      verdict,
      figure: of.bias,
      interval: intervalAround(of.bias, expandedUncertainty),
      limits,
      quantity: "value",
      reason: { code, margin, expandedUncertainty }
    };
  },
  readingsNeeded: ({ parameters }, characteristic, truth, power, assumed) => readingsFor(uncertaintyRule(parameters, characteristic, assumed), truth, power)
};
function against(standardUncertainty, room) {
  if (standardUncertainty <= room) return { verdict: "meets", code: "bias-with-uncertainty-inside" };
  return room < -standardUncertainty ? { verdict: "falls-short", code: "bias-with-uncertainty-outside" } : { verdict: "not-shown", code: "bias-with-uncertainty-crosses" };
}
function uncertaintyRule({ margin: agreed, coverageFactor }, characteristic, assumed = {}) {
  const margin = marginInUnit(agreed, characteristic);
  const { referenceStandardUncertainty = 0 } = assumed;
  return margin === null ? null : { type: "with-uncertainty", margin, referenceStandardUncertainty, coverageFactor };
}

// packages/metrology/src/clauses/bias-zero-test.ts
var biasZeroTest = {
  type: "bias-zero-test",
  subject: "bias",
  measure: "mean",
  basis: "estimate",
  studyKind: "bias",
  fields: [{ name: "alpha", kind: "alpha", required: true, default: 0.05 }],
  check: () => [],
  rule: ({ parameters }) => ({ type: "zero-test", alpha: parameters.alpha }),
  options: ({ parameters }) => ({ confidence: complement(parameters.alpha) }),
  judge: ({ parameters }, facts) => {
    const of = biasFacts(facts.study);
    if (isReason(of)) return notShown(facts, null, of);
    const allowed = twoSidedCritical(parameters.alpha, of.n - 1) * of.standardError;
    const within = Math.abs(of.bias) <= allowed;
    return {
      verdict: within ? "meets" : "falls-short",
      figure: of.bias,
      interval: intervalAround(of.bias, allowed),
      limits: { lower: -allowed, upper: allowed },
      quantity: "value",
      reason: { code: within ? "bias-within-allowed" : "bias-beyond-allowed", allowed }
    };
  },
  // More readings only lower the chance to meet it; at no bias it is 1 − alpha at any number.
  readingsNeeded: () => ({ readings: null, chance: null, reason: "size-does-not-help" })
};

// packages/metrology/src/clauses/by-hand.ts
var undecided = {
  verdict: "not-shown",
  figure: null,
  interval: null,
  limits: null,
  quantity: "value"
};
var byHand = {
  type: "by-hand",
  subject: null,
  measure: null,
  subjectOf: ({ parameters }) => parameters.subject,
  keyOf: ({ parameters }) => `${parameters.subject}/by-hand/${slug(parameters.measure)}`,
  basis: "document",
  studyKind: null,
  fields: [
    { name: "subject", kind: "choice", required: true, choices: subjects, default: "repeatability" },
    { name: "measure", kind: "text", required: true, longest: 60 },
    { name: "asks", kind: "text", required: true, longest: 1e3, lines: true }
  ],
  check: () => [],
  judge: (_clause, { byHand: judged }) => judged ? {
    ...undecided,
    verdict: judged.verdict,
    reason: { code: "judged-by-hand", documentSha256: judged.documentSha256 }
  } : { ...undecided, reason: { code: "no-document" } }
};
var slug = (title) => title.normalize("NFC").trim().toLowerCase().replace(/[\s/]+/g, "-");

// packages/metrology/src/clauses/calibration-in-date.ts
var calibrationInDate = {
  type: "calibration-in-date",
  subject: "calibration",
  measure: "date",
  basis: "document",
  studyKind: null,
  fields: [
    { name: "gauge", kind: "boolean", required: true, default: true },
    { name: "standard", kind: "boolean", required: true, default: true }
  ],
  check: () => [],
  judge: ({ parameters }, { calibration }) => {
    if (!calibration) return { ...undecided2, reason: { code: "calibration-unknown" } };
    const items = asked(parameters, calibration);
    const day = calibration.collectedOn;
    const shown = { figure: day, interval: null, limits: sharedWindow(items), quantity: "date" };
    for (const { window, out } of items) {
      if (window && (day < window.calibratedOn || day > window.dueOn)) {
        return { ...shown, verdict: "falls-short", reason: { code: out, ...window, collectedOn: day } };
      }
    }
    const missing = items.find(({ window }) => !window);
    return missing ? { ...shown, verdict: "not-shown", reason: { code: missing.unknown, collectedOn: day } } : { ...shown, verdict: "meets", reason: { code: "in-calibration", collectedOn: day } };
  }
};
var undecided2 = {
  verdict: "not-shown",
  figure: null,
  interval: null,
  limits: null,
  quantity: "date"
};
function asked(which, { gauge, standard }) {
  const ofGauge = {
    window: gauge,
    unknown: "gauge-calibration-unknown",
    out: "gauge-out-of-calibration"
  };
  const ofStandard = {
    window: standard,
    unknown: "standard-calibration-unknown",
    out: "standard-out-of-calibration"
  };
  return [...which.gauge ? [ofGauge] : [], ...which.standard ? [ofStandard] : []];
}
function sharedWindow(items) {
  const windows = items.flatMap(({ window }) => window ? [window] : []);
  if (windows.length === 0) return null;
  const from = windows.map(({ calibratedOn }) => calibratedOn).sort();
  const until = windows.map(({ dueOn }) => dueOn).sort();
  return { lower: from[from.length - 1] ?? null, upper: until[0] ?? null };
}

// packages/metrology/src/clauses/design-minimum.ts
var designMinimum = {
  type: "design-minimum",
  subject: "design",
  measure: "readings",
  basis: "document",
  studyKind: "bias",
  fields: [
    { name: "readings", kind: "integer", required: true, minimum: 2, maximum: 1e5, default: 15 },
    { name: "registeredBeforehand", kind: "boolean", required: true, default: true },
    { name: "attempts", kind: "integer", required: false, minimum: 1, maximum: 1e3 }
  ],
  check: () => [],
  judge: ({ parameters }, { design, study }) => {
    const n = study?.n ?? null;
    const answer = (verdict, reason) => ({
      verdict,
      figure: n,
      interval: null,
      limits: { lower: parameters.readings, upper: null },
      quantity: "count",
      reason: { ...reason, readings: n, least: parameters.readings }
    });
    if (n === null) return answer("not-shown", { code: "no-study" });
    if (n < parameters.readings) return answer("falls-short", { code: "too-few-readings" });
    const needsDesign = parameters.registeredBeforehand || parameters.attempts !== void 0;
    if (!design) {
      return needsDesign ? answer("not-shown", { code: "design-unknown" }) : answer("meets", { code: "design-as-agreed" });
    }
    if (parameters.registeredBeforehand && !design.registeredBeforehand) {
      return answer("falls-short", { code: "not-registered-beforehand" });
    }
    const most = parameters.attempts ?? null;
    const attempts = { attempts: design.attempts, most };
    return most !== null && design.attempts > most ? answer("falls-short", { code: "too-many-attempts", ...attempts }) : answer("meets", { code: "design-as-agreed", ...attempts });
  },
  readingsNeeded: ({ parameters }) => ({ readings: parameters.readings, chance: null, reason: "minimum" })
};

// packages/metrology/src/clauses/resolution-share.ts
var resolutionShare = {
  type: "resolution-share",
  subject: "resolution",
  measure: "share",
  basis: "document",
  studyKind: null,
  fields: [
    { name: "share", kind: "share", required: true, default: 0.1 },
    { name: "base", kind: "choice", required: true, choices: ["tolerance", "process"], default: "tolerance" },
    { name: "baseline", kind: "baseline", required: false }
  ],
  check: ({ parameters }, characteristic) => baselineProblems(
    parameters.base,
    characteristic,
    { base: "parameters.base", agreed: "parameters.baseline" },
    parameters.baseline
  ),
  judge: ({ parameters }, { characteristic }) => {
    const { base, share, baseline } = parameters;
    const limits = { lower: null, upper: share };
    const unknown = { verdict: "not-shown", figure: null, interval: null, limits, quantity: "share" };
    const width = baselineWidth(base, characteristic, baseline);
    if (!width) return { ...unknown, reason: { code: missingBaseline(base) } };
    const { resolution } = characteristic;
    if (resolution === void 0) return { ...unknown, reason: { code: "resolution-unknown" } };
    const actual = divide(rational(resolution), width);
    const fine = compare(actual, rational(share)) <= 0;
    return {
      verdict: fine ? "meets" : "falls-short",
      figure: toNumber(actual),
      interval: null,
      limits,
      quantity: "share",
      reason: { code: fine ? "resolution-fine-enough" : "resolution-too-coarse", resolution, base }
    };
  }
};

// packages/metrology/src/clauses/does-not-apply.ts
var computedKeys = [
  designMinimum,
  resolutionShare,
  calibrationInDate,
  biasEquivalence,
  biasIndex,
  biasWithUncertainty
].map(({ subject, measure }) => `${subject}/${measure}`);
var doesNotApply = {
  type: "does-not-apply",
  subject: null,
  measure: null,
  // A key begins with its subject; reading the clause has seen to that.
  subjectOf: ({ parameters }) => parameters.key.split("/", 1)[0],
  keyOf: ({ parameters }) => parameters.key,
  basis: "document",
  studyKind: null,
  fields: [
    { name: "key", kind: "clause-key", required: true, choices: computedKeys },
    { name: "reason", kind: "text", required: true, longest: 1e3, lines: true }
  ],
  check: () => [],
  judge: () => ({
    verdict: "not-shown",
    figure: null,
    interval: null,
    limits: null,
    quantity: "value",
    reason: { code: "does-not-apply" }
  })
};

// packages/metrology/src/clauses/fields.ts
var baselineKinds = ["natural-bound", "process", "absolute"];
var longestKey = 100;
var boundsOfKind = {
  share: { above: 0, most: 1 },
  confidence: { least: 0.5, below: 1 },
  alpha: { above: 0, below: 1 }
};
function fieldBounds(field) {
  const own = {};
  if (field.minimum !== void 0) own.least = field.minimum;
  if (field.maximum !== void 0) own.most = field.maximum;
  if (field.exclusiveMinimum !== void 0) own.above = field.exclusiveMinimum;
  if (field.exclusiveMaximum !== void 0) own.below = field.exclusiveMaximum;
  return { ...boundsOfKind[field.kind], ...own };
}
function readField(field, reader) {
  if (!field.required && !reader.has(field.name)) return field.kind === "nullable-number" ? null : void 0;
  switch (field.kind) {
    case "integer":
      return reader.integer(field.name, fieldBounds(field));
    case "number":
    case "nullable-number":
    case "share":
    case "confidence":
    case "alpha":
      return reader.number(field.name, fieldBounds(field));
    case "boolean":
      return reader.boolean(field.name);
    case "choice":
      return reader.choice(field.name, field.choices ?? []);
    case "text":
      return readText(field, reader);
    case "margin":
      return readMargin(reader.object(field.name));
    case "baseline":
      return readBaseline(reader.object(field.name));
    case "clause-key":
      return readKey(field, reader);
  }
}
function readText({ name, longest, lines }, reader) {
  const given2 = reader.text(name).trim();
  const text = lines ? given2 : given2.replace(/\s+/g, " ");
  if (text === "") throw new InvalidInput("missing", `Give ${name}.`, reader.at(name));
  if (longest !== void 0 && text.length > longest) {
    throw new InvalidInput(
      "too-long",
      `Write at most ${longest} characters here; these are ${text.length}.`,
      reader.at(name)
    );
  }
  return text;
}
function readKey({ name, choices = [] }, reader) {
  const key = reader.text(name);
  const [subject, by, title, ...more] = key.split("/");
  const judgedByHand = subjects.some((each) => each === subject) && by === "by-hand" && title && !more.length;
  if (choices.includes(key) || judgedByHand && key.length <= longestKey) return key;
  throw new InvalidInput("not-a-choice", `There is no clause with the key “${key}”.`, reader.at(name));
}
function readMargin(reader) {
  const base = reader.choice("base", ["tolerance", "process", "absolute"]);
  if (base === "absolute") return { base, ...readWithUnit(reader) };
  const share = reader.number("share", { above: 0, most: 1 });
  const baseline = base === "tolerance" ? reader.optionalObject("baseline") : void 0;
  return base === "tolerance" && baseline ? { base, share, baseline: readBaseline(baseline) } : { base, share };
}
function readBaseline(reader) {
  const kind = reader.choice("kind", baselineKinds);
  if (kind === "process") return { kind };
  return kind === "absolute" ? { kind, ...readWithUnit(reader) } : { kind, value: reader.number("value") };
}
function readWithUnit(reader) {
  const unit2 = reader.text("unit");
  if (unit2 === "") throw new InvalidInput("missing", "Give the unit of this value.", reader.at("unit"));
  return { value: reader.number("value", { above: 0 }), unit: unit2 };
}

// packages/metrology/src/clauses/index.ts
var clauseDescriptors = {
  "design-minimum": designMinimum,
  "resolution-share": resolutionShare,
  "calibration-in-date": calibrationInDate,
  "bias-equivalence": biasEquivalence,
  "bias-interval-inside": biasIntervalInside,
  "bias-point": biasPoint,
  "bias-zero-test": biasZeroTest,
  "bias-index": biasIndex,
  "bias-with-uncertainty": biasWithUncertainty,
  "by-hand": byHand,
  "does-not-apply": doesNotApply
};
var clauseTypes = Object.keys(clauseDescriptors);
function clauseDescriptor(clause2) {
  return clauseDescriptors[clause2.type];
}
function clauseKey(clause2) {
  const descriptor = clauseDescriptor(clause2);
  return descriptor.keyOf?.(clause2) ?? `${descriptor.subject}/${descriptor.measure}`;
}
function judgeClause(clause2, facts) {
  return clauseDescriptor(clause2).judge(clause2, facts);
}
function readClause(reader) {
  const { type, parameters, fields } = openClause(reader);
  return assembled(
    type,
    collect(fields, (field) => readField(field, parameters))
  );
}
function openClause(reader) {
  const type = reader.choice("type", clauseTypes);
  return { type, parameters: reader.object("parameters"), fields: clauseDescriptors[type].fields };
}
function collect(fields, read) {
  const given2 = fields.map((field) => [field.name, read(field)]);
  return Object.fromEntries(given2.filter(([, value]) => value !== void 0));
}
function assembled(type, parameters) {
  return { type, parameters };
}

// packages/metrology/src/input/days.ts
var lengths = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];
function asDay(value, path) {
  const [, year, month, day] = /^(\d{4})-(\d{2})-(\d{2})$/.exec(value)?.map(Number) ?? [];
  if (year !== void 0 && month !== void 0 && day !== void 0) {
    const leap = year % 4 === 0 && year % 100 !== 0 || year % 400 === 0;
    const length = month === 2 && leap ? 29 : lengths[month - 1];
    if (length !== void 0 && day >= 1 && day <= length) return value;
  }
  throw new InvalidInput("not-a-day", `Write a day as 2026-10-14; “${value}” is none.`, path);
}

// packages/metrology/src/kinds/judge.ts
function judge(reader) {
  const clause2 = readClause(reader.object("clause"));
  const common2 = readCommon(reader);
  const judgement = judgeClause(clause2, {
    characteristic: characteristicOf(common2),
    design: readDesignFacts(reader),
    calibration: readCalibration(reader),
    study: readResult(reader),
    coverageFactor: common2.coverageFactor,
    byHand: readByHand(reader)
  });
  return { kind: "judge", ...judgement, warnings: [] };
}
function readResult(reader) {
  const source = reader.optionalObject("result")?.ignoreRest();
  if (!source) return null;
  source.choice("kind", ["bias"]);
  const reference = source.optionalObject("reference")?.ignoreRest();
  const uncertain = source.optionalObject("withUncertainty")?.ignoreRest();
  return {
    n: source.integer("n", { least: 1 }),
    bias: source.optionalNumber("bias") ?? null,
    standardDeviation: source.optionalNumber("standardDeviation", { least: 0 }) ?? null,
    reference: {
      value: reference?.optionalNumber("value") ?? 0,
      standardUncertainty: reference?.optionalNumber("standardUncertainty", { least: 0 }) ?? null
    },
    withUncertainty: {
      standardUncertainty: uncertain?.optionalNumber("standardUncertainty", { least: 0 }) ?? null
    }
  };
}
var handVerdicts = ["meets", "falls-short", "not-shown"];
function readByHand(reader) {
  const source = reader.optionalObject("byHand");
  if (!source) return null;
  const documentSha256 = source.text("documentSha256");
  if (!/^[0-9a-f]{64}$/.test(documentSha256)) {
    throw new InvalidInput(
      "not-a-hash",
      "Write the SHA-256 of the document as 64 hexadecimal digits.",
      source.at("documentSha256")
    );
  }
  return { verdict: source.choice("verdict", handVerdicts), reason: source.text("reason"), documentSha256 };
}
function readDesignFacts(reader) {
  const source = reader.optionalObject("design");
  if (!source) return null;
  return {
    registeredBeforehand: source.boolean("registeredBeforehand"),
    attempts: source.integer("attempts", { least: 1 })
  };
}
function readCalibration(reader) {
  const source = reader.optionalObject("calibration");
  if (!source) return null;
  return {
    collectedOn: asDay(source.text("collectedOn"), source.at("collectedOn")),
    gauge: readWindow(source, "gauge"),
    standard: readWindow(source, "standard")
  };
}
function readWindow(reader, name) {
  const source = reader.optionalObject(name);
  if (!source) return null;
  const calibratedOn = asDay(source.text("calibratedOn"), source.at("calibratedOn"));
  const dueOn = asDay(source.text("dueOn"), source.at("dueOn"));
  if (dueOn < calibratedOn) {
    throw new InvalidInput(
      "limits-inverted",
      "The due day must not be before the day of calibration.",
      source.at("dueOn")
    );
  }
  return { calibratedOn, dueOn };
}

// packages/metrology/src/kinds/clause.ts
var aboutUnusedInputs = ["no-margin", "no-tolerance", "one-sided-tolerance"];
function clause(reader) {
  const common2 = readCommon(reader);
  if (common2.unit === void 0)
    throw new InvalidInput("missing", "Give the unit of the readings.", reader.at("unit"));
  const wanted = readClause(reader.object("clause"));
  const characteristic = characteristicOf(common2);
  const study = readStudy(reader, common2, optionsOf(wanted, characteristic));
  const judgement = judgeClause(wanted, {
    characteristic,
    design: readDesignFacts(reader),
    calibration: readCalibration(reader),
    study,
    coverageFactor: common2.coverageFactor,
    byHand: readByHand(reader)
  });
  const needsStudy = clauseDescriptor(wanted).studyKind !== null;
  const warnings = needsStudy && study ? study.warnings : [];
  return {
    kind: "clause",
    clauseKey: clauseKey(wanted),
    ...judgement,
    study,
    warnings: warnings.filter(({ code }) => !aboutUnusedInputs.includes(code))
  };
}
function optionsOf(wanted, characteristic) {
  return clauseDescriptor(wanted).options?.(wanted, characteristic) ?? {};
}
function readStudy(reader, common2, options) {
  const data = reader.optionalObject("data");
  if (!data) return null;
  data.choice("kind", ["bias"]);
  return bias({
    ...common2,
    index: { share: 0.2, sigmas: 6 },
    ...options,
    readings: data.numbers("readings", 1),
    reference: readReference(data)
  });
}

// packages/metrology/src/kinds/distribution.ts
var positive = { above: 0, least: 1e-3, most: 1e8 };
var readers = {
  normal: () => ({
    tails: (z) => ({ lower: normalCdf(z), upper: normalUpperTail(z) }),
    quantile: normalQuantile,
    support: [-Infinity, Infinity]
  }),
  t: (parameters) => {
    const df = parameters.number("df", positive);
    return { tails: (t) => tTails(t, df), quantile: (p) => tQuantile(p, df), support: [-Infinity, Infinity] };
  },
  "noncentral-t": (parameters) => {
    const df = parameters.number("df", { least: 0.1, most: 1e8 });
    const shift = parameters.number("noncentrality", { least: -1e5, most: 1e5 });
    return {
      tails: (t) => noncentralTTails(t, df, shift),
      quantile: (p) => noncentralTQuantile(p, df, shift),
      support: [-Infinity, Infinity]
    };
  },
  "chi-square": (parameters) => {
    const df = parameters.number("df", positive);
    return {
      tails: (x) => chiSquareTails(x, df),
      quantile: (p) => chiSquareQuantile(p, df),
      support: [0, Infinity]
    };
  },
  f: (parameters) => {
    const df1 = parameters.number("df1", positive);
    const df2 = parameters.number("df2", positive);
    return {
      tails: (x) => fTails(x, df1, df2),
      quantile: (p) => fQuantile(p, df1, df2),
      support: [0, Infinity]
    };
  },
  beta: (parameters) => {
    const a = parameters.number("a", positive);
    const b = parameters.number("b", positive);
    return {
      tails: (x) => betaDistributionTails(x, a, b),
      quantile: (p) => betaQuantile(p, a, b),
      support: [0, 1]
    };
  },
  "studentized-range": (parameters) => {
    const groups = parameters.integer("groups", { least: 2, most: 1e3 });
    const df = parameters.number("df", { least: 1, most: 1e8 });
    return {
      tails: (q) => studentizedRangeTails(q, groups, df),
      quantile: (p) => studentizedRangeQuantile(p, groups, df),
      support: [0, Infinity]
    };
  }
};
function distribution(reader) {
  const name = reader.choice("name", Object.keys(readers));
  const wanted = reader.choice("function", ["cdf", "upper-tail", "quantile"]);
  const parameters = reader.optionalObject("parameters") ?? reader.empty("parameters");
  const of = readers[name](parameters);
  const at = reader.numbers("at", 1, wanted === "quantile" ? { least: 0, most: 1 } : {});
  const warnings = [];
  const values = at.map((x, index2) => {
    if (wanted === "cdf") return of.tails(x).lower;
    if (wanted === "upper-tail") return of.tails(x).upper;
    const value = x === 0 ? of.support[0] : x === 1 ? of.support[1] : of.quantile(x);
    if (Number.isFinite(value)) return value;
    const path = `at[${index2}]`;
    warnings.push({ code: "undefined-at-this-value", message: `The quantile at ${x} is not finite.`, path });
    return null;
  });
  return { kind: "distribution", values, warnings };
}

// packages/metrology/src/kinds/incentives.ts
var threshold = 1e-9;
function incentives(rule, n, truth) {
  const truths = truth ? [truth] : truthsMeantToBeAccepted(rule);
  const stricterRule = ruleDescriptor(rule).stricter(rule);
  const now = chanceToMeet(rule, n);
  const before = truths.map(now);
  const strongest = (change, rises, changed) => {
    let worst = { change, truth: truths[0], before: 0, after: 0 };
    let largest2 = -Infinity;
    truths.forEach((at, index2) => {
      const shown = { change, truth: at, before: before[index2] ?? 0, after: changed(at) };
      const wrong = rises ? shown.after - shown.before : shown.before - shown.after;
      if (wrong > largest2) [worst, largest2] = [shown, wrong];
    });
    return { shown: worst, wrong: largest2 > threshold };
  };
  const worse = strongest("worse-repeatability", true, (at) => now(doubled(at)));
  const moreReadings = chanceToMeet(rule, 2 * n);
  const more = strongest("more-readings", false, moreReadings);
  const atHalfTheRisk = stricterRule && chanceToMeet(stricterRule, n);
  const stricter = atHalfTheRisk && strongest("stricter-risk", true, atHalfTheRisk);
  return {
    kind: "incentives",
    worseRepeatabilityHelps: worse.wrong,
    moreReadingsHurt: more.wrong,
    stricterRiskHelps: stricter ? stricter.wrong : null,
    shown: [worse.shown, more.shown, ...stricter ? [stricter.shown] : []],
    warnings: []
  };
}
var doubled = ({ bias: bias2, standardDeviation }) => ({
  bias: bias2,
  standardDeviation: 2 * standardDeviation
});
function truthsMeantToBeAccepted(rule) {
  const { margin, largestSpread } = ruleDescriptor(rule);
  const inside2 = margin(rule);
  const steps = 20;
  if (inside2 === null) {
    return Array.from({ length: 3 * steps + 1 }, (_, i) => ({ bias: i / steps, standardDeviation: 1 }));
  }
  const shares = [0.02, 0.05, 0.1, 0.2, 0.3, 0.4, 0.5, 0.65, 0.8, 1];
  const biases = Array.from({ length: steps }, (_, i) => inside2 * i / steps);
  return shares.flatMap(
    (share) => biases.map((bias2) => ({ bias: bias2, standardDeviation: share * (largestSpread(rule, bias2) ?? inside2) }))
  );
}
function readIncentives(reader) {
  const rule = readRule(reader);
  const n = readDesign(reader);
  const truth = reader.optionalObject("truth");
  return incentives(rule, n, truth && readTruth(truth));
}

// packages/metrology/src/kinds/summary.ts
function summary(reader) {
  const readings = reader.numbers("readings", 1);
  const { n, mean, standardDeviation, lag1Autocorrelation, minimum, maximum } = moments(readings);
  const warnings = [];
  if (n === 1) {
    warnings.push({
      code: "one-reading",
      message: "One reading has no spread: the standard deviation is not defined."
    });
  } else if (standardDeviation === 0) {
    warnings.push({
      code: "below-resolution",
      message: "The readings do not vary: the autocorrelation is not defined."
    });
  }
  return {
    kind: "summary",
    n,
    mean: toNumber(mean),
    standardDeviation,
    lag1Autocorrelation,
    minimum,
    maximum,
    median: median(readings),
    warnings
  };
}
function median(readings) {
  const sorted = Float64Array.from(readings).sort();
  const middle = sorted.length / 2;
  const upper = sorted[Math.floor(middle)] ?? 0;
  if (sorted.length % 2 === 1) return upper;
  const lower = sorted[middle - 1] ?? 0;
  return toNumber(divide(add(rational(lower), rational(upper)), rational(2)));
}

// packages/metrology/src/kinds/index.ts
var kinds = {
  summary,
  bias: (reader) => bias(readBias(reader)),
  operatingCharacteristic: readOperatingCharacteristic,
  sampleSize: readSampleSize,
  incentives: readIncentives,
  judge,
  distribution,
  clause
};

// packages/metrology/src/evaluate.ts
function evaluate(input) {
  try {
    return compute(input);
  } catch (error) {
    if (!(error instanceof InvalidInput)) throw error;
    return { error: { code: error.code, message: error.message, path: error.path } };
  }
}
function compute(input) {
  const reader = Reader.of(input);
  const kind = reader.text("kind");
  if (!isKind(kind)) {
    const known = Object.keys(kinds).join(", ");
    throw new InvalidInput("unknown-kind", `“${kind}” is not computed here; kinds are ${known}.`, "kind");
  }
  readCommon(reader);
  const output = kinds[kind](reader);
  for (const path of reader.unknownFields()) {
    output.warnings.push({
      code: "unknown-field",
      message: `The field ${path} is not known for this kind; it was not used.`,
      path
    });
  }
  return finish(output);
}
function isKind(text) {
  return Object.prototype.hasOwnProperty.call(kinds, text);
}

// packages/metrology/src/version.ts
var ENGINE_VERSION = "0.1.0";
export {
  ENGINE_VERSION,
  canonicalText,
  evaluate
};
