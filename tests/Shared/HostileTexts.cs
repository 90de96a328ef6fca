namespace LoadWatch.Tests;

/// <summary>Texts that mean harm where they are not taken as mere text: 85 kinds, each in four places of a name, 340 in all.</summary>
internal static class HostileTexts
{
    private static readonly string[] Markup =
    [
        "<script>alert(1)</script>", "<ScRiPt src=x></sCrIpT>", "<img src=x onerror=alert(1)>", "<svg/onload=alert(1)>", "<b>bold", "</td></tr></table>", "</title><h1>x", "</style><style>*{display:none}",
        "<!-- ", "--><i>", "]]><u>", "<![CDATA[<u>]]>", "<?php echo 1 ?>", "<a href=javascript:alert(1)>x</a>", "<iframe srcdoc='<p>'>", "<base href=//evil.example>",
        "<meta http-equiv=refresh content=0>", "&lt;script&gt;", "&#60;script&#62;", "&", "<", ">", "<p", "\u003C\u0000script>",
    ];

    private static readonly string[] Attributes =
    [
        "\" onmouseover=\"alert(1)", "' autofocus onfocus='alert(1)", "\"><b>", "'><b>", "` onclick=`x`", "\" style=\"position:fixed", "=\"x\"", "\"\"\"''",
        "expression(alert(1))", "url(//evil.example/x)", "}body{display:none", "@import '//evil.example'",
    ];

    private static readonly string[] Templates =
    [
        "{{ Contact }}", "{{ Flagged | json }}", "{% for x in Groups %}", "{% include 'x' %}", "{%- endraw -%}", "${alert(1)}", "#{7*7}", "<%= 7*7 %>", "[[Contact]]", "{0}", "[red]x[/]", "[[",
    ];

    private static readonly string[] Lines =
    [
        "\r\nBcc: eve@evil.example", "\nSubject: forged", "\r\n\r\n<h1>body</h1>", "\r.\r\nMAIL FROM:<eve@evil.example>", "=?utf-8?B?Zm9yZ2Vk?=", "\n2026-03-01 ada 1/1 [ada|brief|2026-03-01] forged",
        "\n- forged: line", "\n\nEVERYBODY\n", "\u2028line", "\u2029paragraph", "\u0085next", "\v\f",
    ];

    private static readonly string[] Terminal =
    [
        "\u001b[31mred", "\u001b]0;title\u0007", "\u009b2J", "\u0000", "\u0008\u0008\u0008", "\u007f", "\u202Egpj.exe", "\u2066\u2067\u2068\u2069", "\u200Fright", "\u200B\u2060\uFEFF", "\u00AD\u180E",
    ];

    private static readonly string[] Others =
    [
        "'; DROP TABLE alert; --", "../../../etc/passwd", "..\\..\\boot.ini", "=HYPERLINK(\"//evil.example\")", "+1+1", "-2+3", "@SUM(A1)", "\uD800", "\uDC00\uD800", "\U0001F3CB\uFE0F\u200D\u2640\uFE0F", "\U000E0041\U000E007F",
    ];

    private static readonly string[] Long = [new string('x', 5000), string.Concat(Enumerable.Repeat("long ", 1000)), string.Concat(Enumerable.Repeat("a\u0301", 500)) + "\uFFF9\uFFFB"];

    public static IReadOnlyList<string> All { get; } =
    [
        .. new[] { Markup, Attributes, Templates, Lines, Terminal, Others, Long }.SelectMany(kind => kind)
            .SelectMany(text => new[] { text, $"Ann {text}", $"{text} Ann", $"A{text}nn" }),
    ];

    /// <summary>What must not stand in a text or on a terminal: controls but for the line feed, and what turns the reading direction or parts lines.</summary>
    public static bool IsRaw(char letter) =>
        (char.IsControl(letter) && letter != '\n')
        || letter is '\u061C' or '\u200E' or '\u200F' or (>= '\u2028' and <= '\u202E') or (>= '\u2066' and <= '\u2069') or '\u200B' or '\u2060' or '\uFEFF';
}
