;;; settlewell.el --- Check channel sheets with eglot  -*- lexical-binding: t; -*-

;; Emacs 26.3 or later with eglot, which Emacs 29 brings along.

;;; Code:

(require 'eglot)
(require 'conf-mode)
(require 'yaml-mode nil t)

(defgroup settlewell nil
  "Checks of channel sheets."
  :group 'tools)

(defcustom settlewell-command '("settlewell" "serve")
  "The program that is the language server, and its arguments."
  :type '(repeat string))

;; YAML's own mode where it is installed; `conf-colon-mode' knows comments and keys, which will do.
(defalias 'settlewell--parent-mode
  (if (fboundp 'yaml-mode) 'yaml-mode 'conf-colon-mode))

(define-derived-mode settlewell-mode settlewell--parent-mode "Channels"
  "Major mode for channel sheets, NAME.channels.yaml."
  (setq-local indent-tabs-mode nil)
  (setq-local tab-width 2))

(defvar settlewell-mode-map)
(define-key settlewell-mode-map (kbd "C-c C-a") #'eglot-code-actions)
(define-key settlewell-mode-map (kbd "C-c C-r") #'eglot-rename)
(define-key settlewell-mode-map (kbd "C-c C-d") #'eldoc-doc-buffer)
(define-key settlewell-mode-map (kbd "C-c C-n") #'flymake-goto-next-error)
(define-key settlewell-mode-map (kbd "C-c C-p") #'flymake-goto-prev-error)
(define-key settlewell-mode-map (kbd "C-c C-l") #'flymake-show-diagnostics-buffer)

(put 'settlewell-mode 'eglot-language-id "yaml")
(add-to-list 'auto-mode-alist '("\\.channels\\.yaml\\'" . settlewell-mode))
(add-to-list 'eglot-server-programs
             '(settlewell-mode . (lambda (&rest _) settlewell-command)))
(add-hook 'settlewell-mode-hook #'eglot-ensure)

(provide 'settlewell)
;;; settlewell.el ends here
