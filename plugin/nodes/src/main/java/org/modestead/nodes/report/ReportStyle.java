package org.modestead.nodes.report;

/** The style sheet of the written report: one column of text, wide tables and figures, screen and paper. */
final class ReportStyle {
    private static final String RULES = """
            *{box-sizing:border-box}
            html{font-size:16px;-webkit-text-size-adjust:100%}
            body{margin:0;background:var(--paper);color:var(--ink);line-height:1.55;
              font-family:system-ui,"Segoe UI","Noto Sans","DejaVu Sans",sans-serif}
            header,nav,main,footer{max-width:64rem;margin:0 auto;padding:0 1.5rem}
            header{padding-top:2.5rem}
            h1{font-size:2rem;line-height:1.2;margin:0 0 .3rem}
            h2{font-size:1.45rem;line-height:1.25;margin:3rem 0 1rem;padding-top:1rem;border-top:2px solid var(--rule)}
            h3{font-size:1.1rem;margin:2rem 0 .5rem}
            p,ul{margin:.6rem 0;max-width:46rem}
            li{margin:.25rem 0}
            .subtitle,figcaption,.below,footer{color:var(--quiet)}
            a{color:var(--link)}
            .skip{position:absolute;left:-99rem}
            .skip:focus{left:1rem;top:1rem;background:var(--panel);padding:.5rem 1rem}
            nav ol{columns:2;column-gap:3rem;margin:.5rem 0;padding-left:2rem}
            nav li{margin:0;padding:.12rem 0}
            nav h2{font-size:1rem;margin:2rem 0 0;border:0;padding:0}
            .callout{border:1px solid var(--rule);border-left:.4rem solid var(--note);background:var(--panel);
              padding:.7rem 1.1rem;margin:1rem 0}
            .callout p{margin:.3rem 0}
            .callout .title{font-weight:650}
            .firm{border-left-color:var(--firm)}
            .caution{border-left-color:var(--caution);border-left-style:double}
            .stop{border-left-color:var(--stop);border-left-width:.8rem}
            .table{overflow-x:auto;margin:1.2rem 0}
            table{border-collapse:collapse;font-size:.92rem;min-width:24rem}
            caption{text-align:left;font-weight:600;padding:0 0 .4rem}
            th,td{text-align:left;vertical-align:top;padding:.35rem .8rem .35rem .5rem;border-bottom:1px solid var(--rule)}
            thead th{border-bottom:2px solid var(--note);vertical-align:bottom}
            tbody th{font-weight:600}
            td{overflow-wrap:anywhere}
            tbody tr:nth-child(even){background:var(--stripe)}
            .number{text-align:right;font-variant-numeric:tabular-nums}
            tbody .number{white-space:nowrap}
            .below{font-size:.88rem;margin-top:.4rem}
            figure{margin:1.4rem 0;break-inside:avoid}
            figure svg{display:block;width:100%;height:auto;background:#fff;border:1px solid var(--rule);border-radius:4px}
            figcaption{font-size:.92rem;margin-top:.4rem;max-width:52rem}
            .middle{max-width:46rem}
            .small{max-width:32rem}
            .pair{display:grid;grid-template-columns:1fr 1fr;gap:0 1.5rem}
            footer{margin-top:3rem;padding-bottom:2rem;font-size:.88rem}
            @media screen and (max-width:48rem){.pair{grid-template-columns:1fr}nav ol{columns:1}}
            """;
    private static final String PAPER = """
            @page{margin:16mm 14mm}
            html{font-size:10.5pt}
            header,nav,main,footer{max-width:none;padding:0}
            header{padding-top:0}
            .skip{display:none}
            h2,h3,caption{break-after:avoid}
            h2{margin-top:1.6rem}
            .callout,tr{break-inside:avoid}
            thead{display:table-header-group}
            .table{overflow:visible}
            table{font-size:8.5pt;min-width:0}
            th,td{padding:.2rem .5rem .2rem .3rem}
            tbody .number{white-space:normal}
            .middle,.small{max-width:30rem}
            figcaption,.below{font-size:8.5pt}
            a{color:inherit;text-decoration:none}
            """;

    private ReportStyle() {}

    static String css() {
        return ":root{color-scheme:light dark;" + ReportColours.LIGHT.css() + "}\n@media screen and"
                + " (prefers-color-scheme:dark){:root{"
                + ReportColours.DARK.css() + "}}\n" + RULES + "@media print{\n" + PAPER + "}\n";
    }
}
